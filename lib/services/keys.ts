import { v7, validate } from 'uuid';

/** A new id, sorted by time. */
export function newId(): string {
  return v7();
}

/** What a path names: an id where the text is a UUID, else a slug. */
export function keyOf(text: string): { id: string | null; slug: string } {
  return { id: validate(text) ? text : null, slug: text };
}
