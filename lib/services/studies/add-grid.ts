import { insertGrids, listGrids } from '@/db/queries/grids';
import { json } from '@/db/json';
import { isTyped } from '@/lib/domain/studies/check-grid';
import type { GridInput } from '@/lib/domain/studies/input';
import type { Grid } from '@/lib/domain/studies/schema';
import type { MemberContext } from '../context';
import { newId } from '../keys';
import { permit } from '../permit';
import { refuseDuplicate } from '../unique-violation';
import { withOrganisation } from '../with-organisation';
import { announce } from './announce';
import { freezePlan } from './freeze-plan';
import { mapGrid } from './map-grid';
import { refuseUnfitGrid } from './refuse-unfit-grid';
import { lockCollectingStudy } from './require-study';
import { settleStudy } from './settle-study';

/** One grid more, marked as after the data where data came before it. */
export async function addGrid(ctx: MemberContext, studyId: string, input: GridInput): Promise<Grid> {
  permit(ctx, 'work.write');
  const detail = `A grid ${input.label} is already there. Choose another label.`;
  const { row, isSettled } = await refuseDuplicate('grids_label_key', 'label', detail, () => withOrganisation(ctx, async (trx) => {
    const study = await lockCollectingStudy(ctx, trx, studyId);
    refuseUnfitGrid(study, input);
    const { label, ...definition } = input;
    const now = ctx.clock();
    await insertGrids(trx, [{
      organisation_id: ctx.organisation.id, id: newId(), study_id: study.at.studyId, study_revision: study.at.revision, label,
      definition: json(definition), state: isTyped(input) ? 'typed' : 'expected', after_data: study.bound.plan_frozen_at !== null,
    }]);
    if (isTyped(input)) await freezePlan(trx, { ...study, now });
    const isSettled = await settleStudy(trx, study.at, now);
    const rows = await listGrids(trx, study.at);
    return { row: rows.find((candidate) => candidate.label === label), isSettled };
  }));
  if (!row) throw new Error(`Grid ${input.label} is not there after it was added.`);
  await announce(ctx, row.study_id, { event: 'state', state: isSettled ? 'assessing' : 'collecting' });
  return mapGrid(row);
}
