/** What a body of the API may hold at most; a call that takes less says so by itself. */
export const jsonBounds = { depth: 32, members: 50_000, text: 100_000 } as const;

export interface JsonExcess {
  what: keyof typeof jsonBounds;
  /** The byte at which the bound was passed, counted from 1. */
  byte: number;
}

const quote = 34;
const comma = 44;
const backslash = 92;
const open = new Set([91, 123]);
const close = new Set([93, 125]);

/** The place after the string that begins before `from`. */
function endOfString(bytes: Uint8Array, from: number): number {
  let at = from;
  while (at < bytes.length && bytes[at] !== quote) at += bytes[at] === backslash ? 2 : 1;
  return at + 1;
}

/**
 * The first bound that a JSON text passes, or null. One look at each byte and nothing kept, so that what nobody could mean
 * is refused before a parser builds it; whether the text is JSON at all is the parser's question.
 */
export function findJsonExcess(bytes: Uint8Array): JsonExcess | null {
  let depth = 0;
  let members = 0;
  for (let at = 0; at < bytes.length; at += 1) {
    const byte = bytes[at] as number;
    if (byte === quote) {
      const stop = endOfString(bytes, at + 1);
      if (stop - at - 2 > jsonBounds.text) return { what: 'text', byte: at + 1 };
      at = stop - 1;
    } else if (byte === comma) members += 1;
    else if (open.has(byte)) {
      depth += 1;
      members += 1;
    } else if (close.has(byte)) depth -= 1;
    if (depth > jsonBounds.depth) return { what: 'depth', byte: at + 1 };
    if (members > jsonBounds.members) return { what: 'members', byte: at + 1 };
  }
  return null;
}
