import type { GivenDialect } from '@/lib/domain/columns/given-dialect';
import type { DifferenceReading, DifferenceResult } from '@/lib/readers/read-difference';
import type { GridReading } from '@/lib/readers/grid-reading';
import type { GridReadResult } from '@/lib/readers/read-grid';
import type { ReadProgress, SourcePreview } from '@/lib/readers/source';

/** A file in storage, and how long it is. */
export interface StoredFile { storageKey: string; bytes: number }

/**
 * Reads files in storage away from the caller's event loop. All throw RejectedFile where the file cannot be taken;
 * `read` and `difference` throw another error where storage does not give the whole of it.
 */
export interface GridReader {
  preview(storageKey: string, given: GivenDialect): Promise<SourcePreview>;
  /** What two solutions differ by. */
  difference(files: { fine: StoredFile; coarse: StoredFile }, reading: DifferenceReading): Promise<DifferenceResult>;
  read(file: StoredFile, reading: GridReading, onProgress: (progress: ReadProgress) => void): Promise<GridReadResult>;
}
