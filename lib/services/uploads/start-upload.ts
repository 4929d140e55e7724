import { updateGrid } from '@/db/queries/grids';
import { findUpload, insertUpload } from '@/db/queries/uploads';
import { json } from '@/db/json';
import { partSizeOf } from '@/lib/domain/uploads/part-size';
import type { StartUploadInput } from '@/lib/domain/uploads/schema';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { newId } from '../keys';
import { permit } from '../permit';
import { requireOpenPlace, requireRoom } from '../storage/require-room';
import { announce } from '../studies/announce';
import { freezePlan } from '../studies/freeze-plan';
import { requireGrid } from '../studies/require-grid';
import { lockCollectingStudy } from '../studies/require-study';
import { withOrganisation, type Trx } from '../with-organisation';
import { abandonParts } from './abandon-parts';
import { giveUpReceiving } from './give-up-receiving';
import { requireFields } from './require-fields';
import { storageKey } from './storage-key';

type Key = { id: string; label: string };

/** The grid, where the upload may take it: no other is open than the one it knows of, and there is room. */
async function loadTarget(ctx: MemberContext, trx: Trx, key: Key, { bytes, replaces }: StartUploadInput) {
  const study = await lockCollectingStudy(ctx, trx, key.id);
  requireFields(study);
  const grid = await requireGrid(trx, study, key.label);
  const open = grid.state === 'receiving' ? grid.upload_id : null;
  if (replaces !== undefined && open !== null && replaces !== open) {
    const other = await findUpload(trx, ctx.organisation.id, open);
    const detail = `Grid ${grid.label} is being sent${other ? ` by ${other.sender}: ${other.filename}, since ${other.created_at.toISOString()}` : ''}. Replace it by its id, or let it end.`;
    throw new AppError('wrong-state', detail, { fields: [{ path: 'replaces', message: open }] });
  }
  await requireOpenPlace(ctx, trx, open);
  await requireRoom(ctx, trx, { bytes, besides: open });
  return { study, grid };
}

/** Opens an upload in parts for a grid; one that was half sent before is given up. */
export async function startUpload(ctx: MemberContext, key: Key, input: StartUploadInput): Promise<{ upload: string; partSize: number; createdAt: string }> {
  permit(ctx, 'work.write');
  if (input.bytes === 0) {
    throw new AppError('invalid', `${input.filename} is empty. Check that the solver had finished writing.`, { fields: [{ path: 'bytes', message: 'The file is empty.' }] });
  }
  const id = newId();
  const partSize = partSizeOf(input.bytes);
  const createdAt = ctx.clock();
  const { study: { head } } = await withOrganisation(ctx, (trx) => loadTarget(ctx, trx, key, input));
  const storage_key = storageKey(ctx.organisation.id, head.id, id);
  // Asked for between the transactions, so that nobody waits for storage with the study held.
  const multipart_id = await ctx.storage.startMultipart(storage_key);
  const { grid, replaced } = await withOrganisation(ctx, async (trx) => {
    const { study, grid } = await loadTarget(ctx, trx, key, input);
    await insertUpload(trx, {
      organisation_id: ctx.organisation.id, id, grid_id: grid.id, filename: input.filename, bytes: input.bytes, stated_sha256: input.sha256 ?? null,
      fingerprint: input.fingerprint ?? null, storage_key, multipart_id, part_size: partSize,
      created_by: ctx.userId, token_id: ctx.token?.id ?? null, created_at: createdAt, last_activity_at: createdAt,
    });
    const replaced = await giveUpReceiving(trx, grid);
    await updateGrid(trx, ctx.organisation.id, grid.id, { state: 'receiving', upload_id: id, rows_read: null, reasons: json([]) });
    await freezePlan(trx, { ...study, now: ctx.clock() });
    return { grid, replaced };
  }).catch(async (error: unknown) => {
    if (error instanceof AppError) await abandonParts(ctx, { id, storage_key, multipart_id });
    throw error;
  });
  if (replaced) await abandonParts(ctx, replaced);
  await announce(ctx, grid.study_id, { event: 'state', state: 'collecting', grid: grid.label, gridState: 'receiving' });
  return { upload: id, partSize, createdAt: createdAt.toISOString() };
}
