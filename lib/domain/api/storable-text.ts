// PostgreSQL keeps neither in text: a NUL at all, half of a surrogate pair only as another character.
const unstorable = /\0|\p{Surrogate}/u;

/** Whether text can be kept and given back as it is. */
export function isStorable(text: string): boolean {
  return !unstorable.test(text);
}
