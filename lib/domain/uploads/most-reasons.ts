/** What else is wrong with a file shows once these are mended. */
export const mostReasons = 20;
