const usual = 64 * 1024;
/** A line longer than this is not read. */
export const longestLine = 1024 * 1024;

export interface Head {
  bytes: Buffer;
  /** Whether the source ended within the head. */
  complete: boolean;
}

/** Takes the beginning of a file: 64 KiB, more where that holds fewer than three lines, at most 1 MiB. */
export async function readHead(chunks: AsyncGenerator<Buffer, void>): Promise<Head> {
  const parts: Buffer[] = [];
  let length = 0;
  let lineFeeds = 0;
  let returns = 0;
  while (length < usual || (Math.max(lineFeeds, returns) < 3 && length <= longestLine)) {
    const next = await chunks.next();
    if (next.done === true) return { bytes: Buffer.concat(parts), complete: true };
    parts.push(next.value);
    length += next.value.length;
    for (const byte of next.value) {
      if (byte === 10) lineFeeds += 1;
      else if (byte === 13) returns += 1;
    }
  }
  return { bytes: Buffer.concat(parts), complete: false };
}
