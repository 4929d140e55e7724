import { updateGrid as updateGridRow, type GridRow } from '@/db/queries/grids';
import { json } from '@/db/json';
import { isTyped } from '@/lib/domain/studies/check-grid';
import type { UpdateGridInput } from '@/lib/domain/studies/input';
import type { Grid } from '@/lib/domain/studies/schema';
import type { MemberContext } from '../context';
import { enqueueJob } from '../outbox/enqueue-job';
import { permit } from '../permit';
import { staleRevision } from '../stale-revision';
import { withOrganisation } from '../with-organisation';
import { announce } from './announce';
import { freezePlan } from './freeze-plan';
import { definitionOf, type GridDefinition } from './grid-definition';
import { mapGrid } from './map-grid';
import { refuseUnfitGrid } from './refuse-unfit-grid';
import { readsAlike } from './reads-alike';
import { requireGrid } from './require-grid';
import { lockCollectingStudy } from './require-study';
import { settleStudy } from './settle-study';

/** The plan of a grid: what may be changed after the data only with a mark. */
const planned = ['h', 'cells', 'cellsPerDirection', 'dt', 't'] as const;

function nextState(row: GridRow, before: GridDefinition, after: GridDefinition): string {
  if (row.upload_id === null) return isTyped(after) ? 'typed' : 'expected';
  // Another time means another exact solution, another spacing other bands: a file that was read is read again.
  const isReadAgain = !readsAlike(before, after) && ['needs-columns', 'reading', 'read', 'rejected'].includes(row.state);
  return isReadAgain ? 'stored' : row.state;
}

/** Changes a grid, or leaves it out and takes it back in, while the study collects. */
export async function updateGrid(ctx: MemberContext, key: { id: string; label: string }, revision: number, input: UpdateGridInput): Promise<Grid> {
  permit(ctx, 'work.write');
  const { row, isSettled } = await withOrganisation(ctx, async (trx) => {
    const study = await lockCollectingStudy(ctx, trx, key.id);
    const present = await requireGrid(trx, study, key.label);
    const { exclude, ...changes } = input;
    const before = definitionOf(present);
    const after = { ...before, ...changes };
    refuseUnfitGrid(study, { label: key.label, ...after });
    const now = ctx.clock();
    const state = nextState(present, before, after);
    const isLaterPlan = study.bound.plan_frozen_at !== null && planned.some((member) => JSON.stringify(before[member]) !== JSON.stringify(after[member]));
    const isChanged = await updateGridRow(trx, ctx.organisation.id, present.id, {
      // Left alone where it stays: mapping the columns may be moving it on at this moment.
      ...(state === present.state ? {} : { state }),
      definition: json(after), revision: revision + 1, after_data: present.after_data || isLaterPlan,
      ...(exclude === undefined ? {} : { excluded: exclude }),
    }, { revision });
    if (!isChanged) throw staleRevision('grid', present.revision, revision);
    if (state === 'stored' && present.state !== 'stored') {
      await enqueueJob(trx, { organisationId: ctx.organisation.id, job: 'grid.read', subjectId: present.id, subjectRevision: null });
    }
    if (isTyped(after)) await freezePlan(trx, { ...study, now });
    const isSettled = await settleStudy(trx, study.at, now);
    return { row: await requireGrid(trx, study, key.label), isSettled };
  });
  await announce(ctx, row.study_id, { event: 'state', state: isSettled ? 'assessing' : 'collecting', grid: key.label });
  return mapGrid(row);
}
