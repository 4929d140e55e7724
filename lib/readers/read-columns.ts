import { locateColumns } from './locate-columns';
import { openPlainBytes } from './plain-bytes';
import { readHead, type Head } from './read-head';
import { readJson, type ReadColumnsResult } from './read-json';
import type { ReasonCollector } from './reason-collector';
import { sniffFormat } from './sniff-format';
import type { ByteSource, ColumnBatch, ReadProgress } from './source';
import { detectTableDialect } from './table-dialect';
import { createTableParser } from './table-parser';

export interface ReadColumnsOptions {
  /** Names of the columns, as in the header, each once. */
  columns: readonly string[];
  onBatch: (batch: ColumnBatch) => void;
  onProgress?: (progress: ReadProgress) => void;
  signal?: AbortSignal;
  /** Takes what is wrong with rows and values; the caller adds its own and throws. */
  reasons: ReasonCollector;
}

/**
 * Reads columns of a file in one pass and hands them over in batches; memory does not grow with a text table. Throws
 * RejectedFile at once where the file cannot be read on; rows with something wrong are left out and collected in `reasons`.
 */
export async function readColumns(source: ByteSource, options: ReadColumnsOptions): Promise<ReadColumnsResult> {
  const { onBatch, onProgress, signal, reasons } = options;
  const progress: ReadProgress = { rows: 0, bytes: 0 };
  const { chunks } = await openPlainBytes(countBytes(source, progress, signal));
  try {
    const head = await readHead(chunks);
    const all = join(head, chunks);
    const onChunk = (rows: number) => {
      progress.rows = rows;
      onProgress?.({ ...progress });
    };
    const result = sniffFormat(head) === 'json'
      ? await readJson(all, { wanted: options.columns, reasons, onBatch, onChunk })
      : await readTable(head, all, { wanted: options.columns, reasons, onBatch, onChunk });
    if (result.rows === 0 && reasons.isEmpty()) reasons.add({ code: 'too-few-rows', line: null, column: null, found: 'no row of numbers', expected: 'at least 1 row' });
    return result;
  } finally {
    await chunks.return();
  }
}

interface TableOptions {
  wanted: readonly string[];
  reasons: ReasonCollector;
  onBatch: (batch: ColumnBatch) => void;
  onChunk: (rows: number) => void;
}

async function readTable(head: Head, chunks: AsyncIterable<Buffer>, { wanted, reasons, onBatch, onChunk }: TableOptions): Promise<ReadColumnsResult> {
  const dialect = detectTableDialect(head);
  const indices = locateColumns(dialect.header, wanted, dialect.headerLine, reasons);
  // Two names may mean one column; it is read once.
  const distinct = [...new Set(indices)];
  const slots = indices.map((index) => distinct.indexOf(index));
  const columns: Float64Array[] = [];
  const parser = createTableParser({
    dialect, wanted: distinct, reasons,
    onBatch(batch) {
      for (const [at, slot] of slots.entries()) columns[at] = batch.columns[slot] as Float64Array;
      onBatch({ rows: batch.rows, columns, lines: batch.lines });
    },
  });
  for await (const chunk of chunks) {
    parser.push(chunk);
    onChunk(parser.rows());
  }
  parser.end();
  onChunk(parser.rows());
  const digits = parser.significantDigits();
  return {
    rows: parser.rows(), header: dialect.header,
    columns: indices.map((index, at) => ({ index, significantDigits: digits[slots[at] as number] ?? 0 })),
  };
}

async function* countBytes(source: ByteSource, progress: ReadProgress, signal: AbortSignal | undefined): AsyncGenerator<Uint8Array> {
  for await (const chunk of source) {
    signal?.throwIfAborted();
    progress.bytes += chunk.length;
    yield chunk;
  }
}

async function* join(head: Head, rest: AsyncIterable<Buffer>): AsyncGenerator<Buffer> {
  const bom = head.bytes[0] === 0xef && head.bytes[1] === 0xbb && head.bytes[2] === 0xbf;
  yield bom ? head.bytes.subarray(3) : head.bytes;
  yield* rest;
}
