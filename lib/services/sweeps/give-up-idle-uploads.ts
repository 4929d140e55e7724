import { findGrid, findGridOfUpload } from '@/db/queries/grids';
import { findBoundRevision, lockStudyRevision } from '@/db/queries/study-revisions';
import { giveUpIdleUpload, listIdleUploads } from '@/db/queries/swept-uploads';
import { findUpload } from '@/db/queries/uploads';
import type { JobContext } from '../outbox/job-context';
import { announce } from '../studies/announce';
import { abandonParts } from '../uploads/abandon-parts';
import { takeBackUpload } from '../uploads/take-back-upload';
import { withOrganisation } from '../with-organisation';
import { daysAgo } from './sweep-context';

const batch = 100;

async function giveUp(ctx: JobContext, { id, grid_id }: { id: string; grid_id: string }, before: Date): Promise<boolean> {
  const given = await withOrganisation(ctx, async (trx) => {
    const own = await findGridOfUpload(trx, ctx.organisation.id, id) ?? await findGrid(trx, ctx.organisation.id, grid_id);
    if (!own) return null;
    const at = { organisationId: ctx.organisation.id, studyId: own.study_id, revision: own.study_revision };
    await lockStudyRevision(trx, at);
    // Another worker, or the person who sends it, may have been quicker.
    if (!(await giveUpIdleUpload(trx, ctx.organisation.id, id, before))) return null;
    const grid = await findGrid(trx, ctx.organisation.id, own.id);
    const bound = await findBoundRevision(trx, at);
    const isWaitedFor = bound?.state === 'collecting' && grid?.upload_id === id;
    if (isWaitedFor && grid) await takeBackUpload(trx, { at, grid, uploadId: id, now: ctx.clock() });
    return { upload: await findUpload(trx, ctx.organisation.id, id), grid: own, isWaitedFor };
  });
  if (!given) return false;
  if (given.upload) await abandonParts(ctx, given.upload);
  if (given.isWaitedFor) await announce(ctx, given.grid.study_id, { event: 'state', state: 'collecting', grid: given.grid.label });
  return true;
}

/** Gives up uploads in parts of which nothing was heard for a day, as whoever sends them could; how many. */
export async function giveUpIdleUploads(ctx: JobContext): Promise<number> {
  const before = daysAgo(ctx, 1);
  const idle = await withOrganisation(ctx, (trx) => listIdleUploads(trx, ctx.organisation.id, before, batch));
  let count = 0;
  for (const upload of idle) if (await giveUp(ctx, upload, before)) count += 1;
  return count;
}
