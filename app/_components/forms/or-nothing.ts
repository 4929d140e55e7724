/** For `register`: an optional field left empty is not there, instead of an empty text. */
export const orNothing = { setValueAs: (typed: unknown) => (typeof typed === 'string' && typed.trim() === '' ? undefined : typed) };
