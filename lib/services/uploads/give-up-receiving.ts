import { findUpload, updateUploadState, type UploadRow } from '@/db/queries/uploads';
import type { Trx } from '../with-organisation';

interface ReceivingGrid { organisation_id: string; state: string; upload_id: string | null }

/** Gives up what a grid still receives, since another file takes its place; freeing its parts is left to the caller. */
export async function giveUpReceiving(trx: Trx, grid: ReceivingGrid): Promise<UploadRow | undefined> {
  if (grid.state !== 'receiving' || grid.upload_id === null) return undefined;
  const upload = await findUpload(trx, grid.organisation_id, grid.upload_id);
  if (upload) await updateUploadState(trx, grid.organisation_id, upload.id, 'receiving', { state: 'given-up' });
  return upload;
}
