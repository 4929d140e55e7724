import type { ReasonCollector } from './reason-collector';
import type { ColumnBatch, SourcePreview } from './source';

export interface ColumnsAsked {
  wanted: readonly string[];
  /** Has what is wrong with the columns; reading throws once nothing more can be found out. */
  reasons: ReasonCollector;
  onBatch: (batch: ColumnBatch) => void;
  /** Told now and then, however long no batch is complete. */
  onPiece: () => void;
}

export interface ColumnsFound {
  /** Of the columns asked for, in that order; significant digits are null where numbers are not printed in decimal; single where they are stored as float32. */
  columns: { index: number; significantDigits: number | null; isSingle?: boolean }[];
  /** Rows left out because the file marks them as counted elsewhere. */
  leftOut?: number;
}

export type ColumnsPreview = Omit<SourcePreview, 'compressed' | 'format'>;

/** How files of a format that are not text tables are read; the pieces are all of a file, decompressed. */
export interface ColumnFormat {
  preview(pieces: AsyncIterable<Buffer>): Promise<ColumnsPreview>;
  read(pieces: AsyncIterable<Buffer>, asked: ColumnsAsked): Promise<ColumnsFound>;
}
