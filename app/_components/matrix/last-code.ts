/** The cookie that remembers which code of an organisation was last looked at. */
export const lastCodeCookie = (organisation: string) => `fourfold_code_${organisation}`;
