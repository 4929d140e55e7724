export interface Base64Decoder {
  /** Decodes from a place on until its room is full or the text ends, and returns where it stopped; −1 − place where a character is wrong. */
  decode(text: Uint8Array, from: number, to: number): number;
  /** What the last call decoded, in room that is used again. */
  bytes(): Buffer;
  /** Whether the text ended between two groups of four. */
  isComplete(): boolean;
}

const [padding, blank, wrong] = [65, 66, 67];
const alphabet = 'ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789+/';
const codes = new Uint8Array(256).fill(wrong);
for (const [index, character] of [...alphabet].entries()) codes[character.charCodeAt(0)] = index;
for (const character of ' \t\r\n') codes[character.charCodeAt(0)] = blank;
codes['='.charCodeAt(0)] = padding;

const roomBytes = 48 * 1024;

/**
 * Base64 as VTK files have it: the table of lengths may be encoded by itself before the data, so that padding stands in the
 * middle. Each group of four is decoded on its own.
 */
export function createBase64Decoder(): Base64Decoder {
  const room = Buffer.allocUnsafe(roomBytes + 3);
  let filled = 0;
  let group = 0;
  let count = 0;
  let padded = 0;
  return {
    decode(text, from, to) {
      filled = 0;
      for (let at = from; at < to; at += 1) {
        const code = codes[text[at] as number] as number;
        if (code >= padding) {
          if (code === blank) continue;
          if (code === wrong || count < 2) return -1 - at;
          padded += 1;
        } else if (padded > 0) return -1 - at;
        group = (group << 6) | (code & 63 & -Number(code < padding));
        count += 1;
        if (count < 4) continue;
        room[filled] = group >> 16;
        room[filled + 1] = group >> 8;
        room[filled + 2] = group;
        filled += 3 - padded;
        group = 0;
        count = 0;
        padded = 0;
        if (filled >= roomBytes) return at + 1;
      }
      return to;
    },
    bytes: () => room.subarray(0, filled),
    isComplete: () => count === 0,
  };
}
