import { openPlainBytes } from './plain-bytes';
import { readHead, type Head } from './read-head';
import { sniffFormat } from './sniff-format';
import type { ByteSource, SourceFormat } from './source';

/** What reads a file of each format; `pieces` are all of its bytes, decompressed, without a byte order mark. */
export type FormatReaders<Result> = Record<SourceFormat, (pieces: AsyncGenerator<Buffer, void>, head: Head) => Promise<Result>>;

export interface ReadSourceOptions {
  /** Told before bytes are read on, as stored. */
  onBytes?: (chunk: Uint8Array) => void;
  signal?: AbortSignal;
}

/** Opens a file and has it read by what its content calls for. Throws RejectedFile where it is nothing that is read. */
export async function readSource<Result>(source: ByteSource, readers: FormatReaders<Result>, options: ReadSourceOptions = {}): Promise<Result> {
  const { chunks } = await openPlainBytes(told(source, options));
  try {
    const head = await readHead(chunks);
    return await readers[sniffFormat(head)](join(head, chunks), head);
  } finally {
    await chunks.return();
  }
}

async function* told(source: ByteSource, { onBytes, signal }: ReadSourceOptions): AsyncGenerator<Uint8Array> {
  for await (const chunk of source) {
    signal?.throwIfAborted();
    onBytes?.(chunk);
    yield chunk;
  }
}

async function* join(head: Head, rest: AsyncIterable<Buffer>): AsyncGenerator<Buffer, void> {
  const bom = head.bytes[0] === 0xef && head.bytes[1] === 0xbb && head.bytes[2] === 0xbf;
  yield bom ? head.bytes.subarray(3) : head.bytes;
  yield* rest;
}
