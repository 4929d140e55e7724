import { updateGrid } from '@/db/queries/grids';
import { json } from '@/db/json';
import { enqueueJob } from '../outbox/enqueue-job';
import type { Trx } from '../with-organisation';

/** Makes a whole file the file of its grid and has it read. */
export async function receiveFile(trx: Trx, { organisationId, gridId, uploadId }: { organisationId: string; gridId: string; uploadId: string }): Promise<void> {
  await updateGrid(trx, organisationId, gridId, { state: 'stored', upload_id: uploadId, rows_read: null, reasons: json([]) });
  await enqueueJob(trx, { organisationId, job: 'grid.read', subjectId: gridId, subjectRevision: null });
}
