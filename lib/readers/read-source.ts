import type { ColumnFormat } from './column-format';
import { columnFormats } from './column-formats';
import { openPlainBytes } from './plain-bytes';
import { readHead, type Head } from './read-head';
import { sniffFormat } from './sniff-format';
import type { ByteSource, SourceFormat } from './source';

export interface OpenSource {
  format: SourceFormat;
  compressed: boolean;
  /** All bytes, decompressed, without a byte order mark. */
  pieces: AsyncGenerator<Buffer, void>;
  head: Head;
}

/** What reads a file: text tables one way, formats that have columns in another. */
export interface SourceReaders<Result> {
  table(source: OpenSource): Promise<Result>;
  columns(reader: ColumnFormat, source: OpenSource): Promise<Result>;
}

export interface ReadSourceOptions {
  /** Told before bytes are read on, as stored. */
  onBytes?: (chunk: Uint8Array) => void;
  signal?: AbortSignal;
}

/** Opens a file and has it read by what its content calls for. Throws RejectedFile where it is nothing that is read. */
export async function readSource<Result>(source: ByteSource, readers: SourceReaders<Result>, options: ReadSourceOptions = {}): Promise<Result> {
  const { compressed, chunks } = await openPlainBytes(told(source, options));
  try {
    const head = await readHead(chunks);
    const format = sniffFormat(head);
    const opened: OpenSource = { format, compressed, head, pieces: join(head, chunks) };
    return await (format === 'table' ? readers.table(opened) : readers.columns(columnFormats[format], opened));
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
