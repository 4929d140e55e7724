import type { GridReading } from '@/lib/readers/grid-reading';
import type { GridReadResult } from '@/lib/readers/read-grid';
import type { ReadProgress, SourcePreview } from '@/lib/readers/source';

/** Reads files in storage away from the caller's event loop. Both throw RejectedFile where the file cannot be taken. */
export interface GridReader {
  preview(storageKey: string): Promise<SourcePreview>;
  read(storageKey: string, reading: GridReading, onProgress: (progress: ReadProgress) => void): Promise<GridReadResult>;
}
