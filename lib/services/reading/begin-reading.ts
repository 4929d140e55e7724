import { findGrid, updateGrid } from '@/db/queries/grids';
import { findStudy, type StudyHead } from '@/db/queries/studies';
import { findBoundRevision, lockStudyRevision, type BoundRevision, type RevisionKey } from '@/db/queries/study-revisions';
import { findUpload, type UploadRow } from '@/db/queries/uploads';
import type { JobContext } from '../outbox/job-context';
import { definitionOf } from '../studies/grid-definition';
import { readsAlike } from '../studies/reads-alike';
import { withOrganisation, type Trx } from '../with-organisation';

/** A grid whose file is being read, as it was when the reading began. */
export interface Reading {
  at: RevisionKey;
  grid: NonNullable<Awaited<ReturnType<typeof findGrid>>>;
  upload: UploadRow;
  head: StudyHead;
  bound: BoundRevision;
}

async function load(ctx: JobContext, trx: Trx, gridId: string): Promise<Reading | null> {
  const grid = await findGrid(trx, ctx.organisation.id, gridId);
  if (!grid?.upload_id) return null;
  const at = { organisationId: ctx.organisation.id, studyId: grid.study_id, revision: grid.study_revision };
  await lockStudyRevision(trx, at);
  const head = await findStudy(trx, ctx.organisation.id, grid.study_id);
  const bound = await findBoundRevision(trx, at);
  const current = await findGrid(trx, ctx.organisation.id, gridId);
  const upload = current?.upload_id ? await findUpload(trx, ctx.organisation.id, current.upload_id) : undefined;
  if (!head || !bound || !current || !upload || head.revision !== at.revision || bound.state !== 'collecting') return null;
  return { at, grid: current, upload, head, bound };
}

/**
 * Claims a grid whose file is stored. One found in `reading` was begun by an attempt that died, or is being read by
 * another: reading it again does no harm, since only the first to finish is heard. Null where there is nothing to read.
 */
export async function beginReading(ctx: JobContext, gridId: string): Promise<Reading | null> {
  return withOrganisation(ctx, async (trx) => {
    const reading = await load(ctx, trx, gridId);
    if (!reading) return null;
    const isClaimed = await updateGrid(trx, ctx.organisation.id, gridId, { state: 'reading', rows_read: 0 }, { states: ['stored', 'reading'] });
    return isClaimed ? reading : null;
  });
}

/**
 * Runs `work` with the revision held, where the reading is still the one the grid waits for: same file, same statement, not
 * finished by another. Whether it was.
 */
export async function whileReading(ctx: JobContext, { grid, upload }: Reading, work: (trx: Trx) => Promise<void>): Promise<boolean> {
  return withOrganisation(ctx, async (trx) => {
    const now = await load(ctx, trx, grid.id);
    if (now?.grid.state !== 'reading' || now.upload.id !== upload.id || !readsAlike(definitionOf(now.grid), definitionOf(grid))) return false;
    await work(trx);
    return true;
  });
}
