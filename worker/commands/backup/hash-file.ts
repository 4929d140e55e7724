import { createHash } from 'node:crypto';
import fs from 'node:fs';
import { Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';

export interface FileFacts { bytes: number; sha256: string }

/** Passes bytes on and keeps their number and SHA-256. */
export function createMeter(): { stream: Transform; facts: () => FileFacts } {
  const hash = createHash('sha256');
  let bytes = 0;
  const stream = new Transform({
    transform(chunk: Buffer, _encoding, next) {
      hash.update(chunk);
      bytes += chunk.length;
      next(null, chunk);
    },
  });
  let sha256: string | undefined;
  return { stream, facts: () => ({ bytes, sha256: (sha256 ??= hash.digest('hex')) }) };
}

/** Number and SHA-256 of the bytes of a file; null where there is none. */
export async function hashFile(file: string): Promise<FileFacts | null> {
  if (!fs.existsSync(file)) return null;
  const { stream, facts } = createMeter();
  await pipeline(fs.createReadStream(file), stream, async (chunks: AsyncIterable<Buffer>) => {
    for await (const chunk of chunks) void chunk;
  });
  return facts();
}

/** Whether a file in the backup is what the manifest says, in words where it is not. */
export async function faultOf(name: string, file: string, stated: FileFacts): Promise<string | null> {
  const found = await hashFile(file);
  if (!found) return `${name} is not in the backup.`;
  if (found.bytes !== stated.bytes) return `${name} has ${found.bytes} bytes; the backup was made with ${stated.bytes}.`;
  return found.sha256 === stated.sha256 ? null : `${name} is damaged: its SHA-256 is ${found.sha256}, and was ${stated.sha256}.`;
}
