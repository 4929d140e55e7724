import { Readable, pipeline } from 'node:stream';
import { createGunzip } from 'node:zlib';
import { createExpansionLimit } from './expansion-limit';
import { RejectedFile } from './rejected-file';
import type { ByteSource } from './source';

export interface PlainBytes {
  compressed: boolean;
  chunks: AsyncGenerator<Buffer, void>;
}

/** The bytes of a source, decompressed where they begin as gzip does. */
export async function openPlainBytes(source: ByteSource): Promise<PlainBytes> {
  const iterator = source[Symbol.asyncIterator]();
  let head = Buffer.alloc(0);
  while (head.length < 2) {
    const next = await iterator.next();
    if (next.done === true) break;
    head = Buffer.concat([head, next.value]);
  }
  const all = rejoin(head, iterator);
  const compressed = head[0] === 0x1f && head[1] === 0x8b;
  return { compressed, chunks: compressed ? decompress(all) : all };
}

async function* rejoin(head: Buffer, iterator: AsyncIterator<Uint8Array>): AsyncGenerator<Buffer, void> {
  try {
    if (head.length > 0) yield head;
    for (let next = await iterator.next(); next.done !== true; next = await iterator.next()) {
      const { buffer, byteOffset, byteLength } = next.value;
      yield Buffer.from(buffer, byteOffset, byteLength);
    }
  } finally {
    await iterator.return?.();
  }
}

async function* decompress(chunks: AsyncGenerator<Buffer, void>): AsyncGenerator<Buffer, void> {
  const gunzip = createGunzip({ chunkSize: 256 * 1024 });
  const limit = createExpansionLimit();
  async function* counted(): AsyncGenerator<Buffer, void> {
    for await (const chunk of chunks) {
      limit.noteStored(chunk.length);
      // The stream holds on to what it is given, while a source may use its buffer again.
      yield Buffer.from(chunk);
    }
  }
  // What goes wrong in the source destroys the stream with that error, and the loop below throws it.
  pipeline(Readable.from(counted()), gunzip, () => undefined);
  try {
    for await (const chunk of gunzip as AsyncIterable<Buffer>) {
      limit.noteExpanded(chunk.length);
      yield chunk;
    }
  } catch (error) {
    if (!isGzipDamage(error)) throw error;
    throw new RejectedFile([{
      code: 'damaged-gzip', count: 1, line: null, column: null, found: error.message, expected: 'a complete gzip file',
    }]);
  }
}

function isGzipDamage(error: unknown): error is Error {
  return error instanceof Error && 'code' in error && typeof error.code === 'string' && error.code.startsWith('Z_');
}
