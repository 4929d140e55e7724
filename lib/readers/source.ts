import type { DecimalMarkName, Delimiter, GivenDialect } from '../domain/columns/given-dialect';

/** The bytes of a file as they are stored, compressed or not. */
export type ByteSource = AsyncIterable<Uint8Array>;

export type SourceFormat = 'table' | 'json' | 'hdf5' | 'vtk';

/** What the beginning of a file shows. A file without a header names its columns c1, c2 … */
export interface SourcePreview {
  format: SourceFormat;
  compressed: boolean;
  /** Null for all but tables. */
  delimiter: Delimiter | null;
  hasHeader: boolean;
  header: string[];
  firstRows: string[][];
  /** Of a text table only, and absent from what was kept before they were known: the line of the names, the mark of the first numbers. */
  headerLine?: number;
  decimalMark?: DecimalMarkName | null;
  /** What was said of the table before it was looked into. */
  given?: GivenDialect;
}

/** Up to 2048 rows. The arrays are used again for the next batch: copy what is kept. */
export interface ColumnBatch {
  rows: number;
  /** In the order in which the columns were asked for. */
  columns: Float64Array[];
  /** The line of each row, null where rows have no line of their own (JSON). */
  lines: Float64Array | null;
}

export interface ReadProgress {
  rows: number;
  /** Bytes taken from the source, as stored. */
  bytes: number;
}
