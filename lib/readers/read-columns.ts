import { createHash } from 'node:crypto';
import type { GivenDialect } from '../domain/columns/given-dialect';
import { createGridChecks, type GridChecks } from './grid-checks';
import { locateColumns } from './locate-columns';
import { readSource, type OpenSource } from './read-source';
import type { ByteSource, ColumnBatch, ReadProgress } from './source';
import { createChunkReader, type ChunkStart } from './table/read-chunk';
import { readChunks } from './table/read-chunks';
import { createTableMemory } from './table/table-memory';
import { detectTableDialect } from './table/table-dialect';

export interface ReadColumnsOptions {
  names: readonly string[];
  /** How a text table is written, as far as it was said. */
  given?: GivenDialect;
  onBatch: (batch: ColumnBatch) => void;
  onProgress?: (progress: ReadProgress) => void;
}

export interface ColumnsOfFile {
  /** Of the columns, in the order asked for; null where numbers are not printed in decimal. */
  digits: (number | null)[];
  rows: number;
  sha256: string;
  bytes: number;
}

/** Reads columns of a file of any format in one pass, as they are. Throws RejectedFile with every reason where it cannot be taken. */
export async function readColumns(source: ByteSource, { names, given, onBatch, onProgress }: ReadColumnsOptions): Promise<ColumnsOfFile> {
  const checks = createGridChecks(undefined);
  const hash = createHash('sha256');
  let rows = 0;
  let bytes = 0;
  const take = (batch: ColumnBatch) => {
    rows += batch.rows;
    onBatch(batch);
  };
  const onPiece = () => onProgress?.({ rows, bytes });
  const digits = await readSource<(number | null)[]>(source, {
    columns: async (reader, { pieces }) => {
      const { columns } = await reader.read(pieces, { wanted: names, reasons: checks.rows, onBatch: take, onPiece });
      return columns.map(({ significantDigits }) => significantDigits);
    },
    table: (opened) => readTable(opened, { names, given, checks, onBatch: take, onPiece }),
  }, {
    onBytes(chunk) {
      hash.update(chunk);
      bytes += chunk.length;
    },
  });
  if (rows === 0 && checks.isClean()) {
    checks.rows.add({ code: 'too-few-rows', line: null, column: null, found: 'no row of numbers', expected: 'at least 1 row' });
  }
  checks.throwIfAny(undefined);
  return { digits, rows, sha256: hash.digest('hex'), bytes };
}

interface TableOptions { names: readonly string[]; given: GivenDialect | undefined; checks: GridChecks; onBatch: (batch: ColumnBatch) => void; onPiece: () => void }

async function readTable({ pieces, head }: OpenSource, { names, given, checks, onBatch, onPiece }: TableOptions): Promise<number[]> {
  const dialect = detectTableDialect(head, given);
  const indices = locateColumns(dialect.header, names, dialect.headerLine, checks.rows);
  // Two names may mean one column; it is read once.
  const wanted = [...new Set(indices)];
  const slots = indices.map((index) => wanted.indexOf(index));
  const memory = createTableMemory();
  const reader = createChunkReader({ dialect, wanted, memory });
  const deliver = ({ rows, columns, lines }: ColumnBatch) => onBatch({ rows, lines, columns: slots.map((slot) => columns[slot] as Float64Array) });
  const work = {
    read(bytes: Uint8Array, start: ChunkStart) {
      const end = reader.read(bytes, start, checks.rows, deliver);
      const digits = reader.significantDigits();
      return { part: null, ...end, digits: slots.map((slot) => digits[slot] ?? 0) };
    },
    readAhead: () => null,
  };
  return readChunks(pieces, { dialect, memory, work, checks, onPart: onPiece });
}
