/** A mail before it is set as text or HTML. */
export interface Letter {
  subject: string;
  paragraphs: string[];
  facts: { name: string; value: string }[];
  action: { label: string; url: string } | null;
  /** In small print at the end: why it came, and what to do when it should not have. */
  note: string;
}

/** Where the links of a letter lead; the token is the one made as the letter is sent. */
export interface LetterLinks { base: string; token: string | null }

export function linkTo({ base }: LetterLinks, path: string): string {
  return new URL(path, base).href;
}
