import { updateGrid } from '@/db/queries/grids';
import { insertUpload } from '@/db/queries/uploads';
import { json } from '@/db/json';
import { partSizeOf } from '@/lib/domain/uploads/part-size';
import type { StartUploadInput } from '@/lib/domain/uploads/schema';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { newId } from '../keys';
import { permit } from '../permit';
import { announce } from '../studies/announce';
import { freezePlan } from '../studies/freeze-plan';
import { requireGrid } from '../studies/require-grid';
import { lockCollectingStudy } from '../studies/require-study';
import { withOrganisation, type Trx } from '../with-organisation';
import { abandonParts } from './abandon-parts';
import { giveUpReceiving } from './give-up-receiving';
import { requireFields } from './require-fields';
import { storageKey } from './storage-key';

/** Opens an upload in parts for a grid; one that was half sent before is given up. */
export async function startUpload(ctx: MemberContext, key: { id: string; label: string }, input: StartUploadInput): Promise<{ upload: string; partSize: number }> {
  permit(ctx, 'work.write');
  if (input.bytes === 0) {
    throw new AppError('invalid', `${input.filename} is empty. Check that the solver had finished writing.`, { fields: [{ path: 'bytes', message: 'The file is empty.' }] });
  }
  const id = newId();
  const partSize = partSizeOf(input.bytes);
  const target = async (trx: Trx) => {
    const study = await lockCollectingStudy(ctx, trx, key.id);
    requireFields(study);
    return { study, grid: await requireGrid(trx, study, key.label) };
  };
  const { study: { head } } = await withOrganisation(ctx, target);
  const storage_key = storageKey(ctx.organisation.id, head.id, id);
  // Asked for between the transactions, so that nobody waits for storage with the study held.
  const multipart_id = await ctx.storage.startMultipart(storage_key);
  const { grid, replaced } = await withOrganisation(ctx, async (trx) => {
    const { study, grid } = await target(trx);
    await insertUpload(trx, {
      organisation_id: ctx.organisation.id, id, grid_id: grid.id, filename: input.filename, bytes: input.bytes, stated_sha256: input.sha256 ?? null,
      storage_key, multipart_id, part_size: partSize,
      created_by: ctx.userId, token_id: ctx.token?.id ?? null,
    });
    const replaced = await giveUpReceiving(trx, grid);
    await updateGrid(trx, ctx.organisation.id, grid.id, { state: 'receiving', upload_id: id, rows_read: null, reasons: json([]) });
    await freezePlan(trx, { ...study, now: ctx.clock() });
    return { grid, replaced };
  });
  if (replaced) await abandonParts(ctx, replaced);
  await announce(ctx, grid.study_id, { event: 'state', state: 'collecting', grid: grid.label, gridState: 'receiving' });
  return { upload: id, partSize };
}
