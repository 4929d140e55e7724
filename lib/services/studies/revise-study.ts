import { findCaseBinding } from '@/db/queries/case-bindings';
import { copyGridMaps } from '@/db/queries/grid-maps';
import { copyGridResult } from '@/db/queries/grid-results';
import { insertGrids, listGrids, type GridRow } from '@/db/queries/grids';
import { advanceStudyRevision } from '@/db/queries/studies';
import { insertStudyRevision, updateRevisionState, type RevisionKey } from '@/db/queries/study-revisions';
import { json } from '@/db/json';
import { builtInRule } from '@/lib/domain/rules/built-in-rule';
import type { Study } from '@/lib/domain/studies/schema';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { newId } from '../keys';
import { enqueueJob } from '../outbox/enqueue-job';
import { permit } from '../permit';
import { withOrganisation, type Trx } from '../with-organisation';
import { announce } from './announce';
import { mapStudy } from './map-study';
import { lockStudy, requireStudy, type LoadedStudy } from './require-study';

function requireRevisable({ bound }: LoadedStudy): void {
  if (['assessed', 'assessment-failed'].includes(bound.state)) return;
  if (bound.state !== 'collecting') throw new AppError('wrong-state', `The study is ${bound.state}. A new revision can be opened once it is assessed.`);
  if (bound.plan_frozen_at !== null) return;
  throw new AppError('wrong-state', 'The study still collects and has no data yet: change its grids or its case as they are.');
}

/** A copy of the grid in the next revision. A file read under other definitions is read again; one half sent goes on. */
async function copyGrid(trx: Trx, row: GridRow, { at, isSameDefinition }: { at: RevisionKey; isSameDefinition: boolean }): Promise<void> {
  const id = newId();
  const isKept = row.upload_id === null || row.state === 'receiving' || (isSameDefinition && ['read', 'rejected'].includes(row.state));
  await insertGrids(trx, [{
    organisation_id: at.organisationId, id, study_id: at.studyId, study_revision: at.revision, label: row.label, definition: json(row.definition),
    state: isKept ? row.state : 'stored', excluded: row.excluded, after_data: row.after_data, upload_id: row.upload_id,
    rows_read: isKept ? row.rows_read : null, reasons: json(isKept ? row.reasons : []),
  }]);
  if (!isKept) await enqueueJob(trx, { organisationId: at.organisationId, job: 'grid.read', subjectId: id, subjectRevision: null });
  else if (row.state === 'read') {
    await copyGridResult(trx, at.organisationId, row.id, id);
    await copyGridMaps(trx, at.organisationId, row.id, id);
  }
}

/**
 * Opens the next revision with the grids, files and results of this one, bound to the case and problem as they are now.
 * Also while collecting, once data has frozen the plan: a case mended meanwhile could not be reached otherwise.
 */
export async function reviseStudy(ctx: MemberContext, id: string): Promise<Study> {
  permit(ctx, 'work.write');
  const study = await withOrganisation(ctx, async (trx) => {
    const loaded = await lockStudy(ctx, trx, id);
    requireRevisable(loaded);
    const { head, bound, at: before } = loaded;
    const at = { ...before, revision: before.revision + 1 };
    const latest = await findCaseBinding(trx, ctx.organisation.id, { id: head.case_id, slug: head.case_slug });
    if (!latest || !(await advanceStudyRevision(trx, ctx.organisation.id, head.id, before.revision))) {
      throw new AppError('wrong-state', 'Somebody opened a new revision at the same moment. Read the study again.');
    }
    const now = ctx.clock();
    await updateRevisionState(trx, before, ['collecting'], { state: 'abandoned', failure: `Left for revision ${at.revision}.`, since: now });
    await insertStudyRevision(trx, {
      organisation_id: ctx.organisation.id, study_id: head.id, revision: at.revision, case_id: head.case_id, case_revision: latest.case_revision,
      problem_id: latest.problem_id, problem_revision: latest.problem_revision, rule_revision: builtInRule.revision, state_since: now,
      plan_frozen_at: bound.plan_frozen_at, created_by: ctx.userId,
    });
    const isSameDefinition = latest.case_revision === bound.case_revision && latest.problem_id === bound.problem_id
      && latest.problem_revision === bound.problem_revision;
    for (const row of await listGrids(trx, before)) await copyGrid(trx, row, { at, isSameDefinition });
    return mapStudy(ctx, trx, await requireStudy(ctx, trx, id));
  });
  await announce(ctx, study.id, { event: 'state', state: study.state });
  return study;
}
