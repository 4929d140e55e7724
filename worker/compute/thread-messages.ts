import type { GivenDialect } from '@/lib/domain/columns/given-dialect';
import type { RejectionReason } from '@/lib/domain/uploads/rejection';
import type { DifferenceReading, DifferenceResult } from '@/lib/readers/read-difference';
import type { GridReading } from '@/lib/readers/grid-reading';
import type { GridReadResult } from '@/lib/readers/read-grid';
import type { StoredFile } from '@/lib/services/reading/grid-reader';
import type { ReadProgress, SourcePreview } from '@/lib/readers/source';

/** What a thread is asked to do with one file in storage. */
export type ThreadTask =
  | { kind: 'preview'; storageKey: string; given: GivenDialect }
  | { kind: 'difference'; fine: StoredFile; coarse: StoredFile; reading: DifferenceReading }
  | { kind: 'read'; storageKey: string; bytes: number; reading: GridReading };

/** A task on its way; whether a core is left for a second thread. */
export type GivenTask = ThreadTask & { mayHaveHelp: boolean };

export type ThreadResult = { kind: 'preview'; preview: SourcePreview } | { kind: 'difference'; result: DifferenceResult } | { kind: 'read'; result: GridReadResult };

/** What a thread says; every task ends in one message of the last three. */
export type ThreadMessage =
  | { type: 'alive' }
  | { type: 'progress'; progress: ReadProgress }
  | { type: 'done'; result: ThreadResult }
  | { type: 'rejected'; reasons: RejectionReason[] }
  | { type: 'failed'; message: string };
