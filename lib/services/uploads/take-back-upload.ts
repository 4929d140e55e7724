import { updateGrid } from '@/db/queries/grids';
import type { RevisionKey } from '@/db/queries/study-revisions';
import { findStoredUpload } from '@/db/queries/uploads';
import { json } from '@/db/json';
import { isTyped } from '@/lib/domain/studies/check-grid';
import { definitionOf } from '../studies/grid-definition';
import { settleStudy } from '../studies/settle-study';
import type { Trx } from '../with-organisation';
import { receiveFile } from './receive-file';
import type { LoadedUpload } from './require-upload';

interface TakenBack { at: RevisionKey; grid: LoadedUpload['grid']; uploadId: string; now: Date }

/** The grid goes back to the file it had before, or to having none. The revision must be held by the caller. */
export async function takeBackUpload(trx: Trx, { at, grid, uploadId, now }: TakenBack): Promise<void> {
  const before = await findStoredUpload(trx, at.organisationId, grid, uploadId);
  if (before) {
    await receiveFile(trx, { organisationId: at.organisationId, gridId: grid.id, uploadId: before.id });
    return;
  }
  await updateGrid(trx, at.organisationId, grid.id, {
    state: isTyped(definitionOf(grid)) ? 'typed' : 'expected', upload_id: null, rows_read: null, reasons: json([]),
  });
  await settleStudy(trx, at, now);
}
