import { findCaseBinding } from '@/db/queries/case-bindings';
import { insertGrids } from '@/db/queries/grids';
import { insertStudy } from '@/db/queries/studies';
import { insertStudyRevision } from '@/db/queries/study-revisions';
import { json } from '@/db/json';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import { domainVolume } from '@/lib/domain/problems/domain-volume';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { builtInRule } from '@/lib/domain/rules/built-in-rule';
import { isTyped } from '@/lib/domain/studies/check-grid';
import { checkSeries } from '@/lib/domain/studies/check-series';
import type { CreateStudyInput } from '@/lib/domain/studies/input';
import type { Study } from '@/lib/domain/studies/schema';
import { filesTellSpacing } from '@/lib/domain/studies/takes-files';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { keyOf, newId } from '../keys';
import { permit, permitCode } from '../permit';
import { requireRelease } from '../releases/require-release';
import { withOrganisation, type Trx } from '../with-organisation';
import { mapStudy } from './map-study';
import { requireStudy } from './require-study';
import { settleStudy } from './settle-study';

async function requireCaseBinding(ctx: MemberContext, trx: Trx, key: string) {
  const row = await findCaseBinding(trx, ctx.organisation.id, keyOf(key));
  if (!row) throw new AppError('not-found', `There is no case “${key}”.`);
  permitCode(ctx, row.code_id);
  return { ...row, definition: caseDefinitionSchema.parse(row.case_definition), problem: problemDefinitionSchema.parse(row.problem_definition) };
}

function checkInput(input: CreateStudyInput, bound: Awaited<ReturnType<typeof requireCaseBinding>>): 1 | 2 | 3 {
  const { refinement } = input;
  const dimension = input.dimension ?? bound.problem.dimension;
  const faults = checkSeries(input.grids, {
    definition: bound.definition, refinement, dimension, volume: domainVolume(bound.problem, dimension),
    canHaveFile: filesTellSpacing(bound.definition, bound.problem),
  });
  if (faults.length > 0) throw new AppError('invalid', faults[0]?.message ?? 'The grids do not fit the case.', { fields: faults });
  return dimension;
}

/** A study of a case on a release. Grids whose values are typed are data: with them the plan is frozen at once. */
export async function createStudy(ctx: MemberContext, input: CreateStudyInput): Promise<Study> {
  permit(ctx, 'work.write');
  return withOrganisation(ctx, async (trx) => {
    const bound = await requireCaseBinding(ctx, trx, input.case);
    const release = await requireRelease(ctx, trx, { id: bound.code_id, slug: bound.code_slug }, input.release);
    const { refinement } = input;
    const dimension = checkInput(input, bound);
    const now = ctx.clock();
    const organisationId = ctx.organisation.id;
    const at = { organisationId, studyId: newId(), revision: 1 };
    await insertStudy(trx, {
      organisation_id: organisationId, id: at.studyId, case_id: bound.id, release_id: release.id, refinement, dimension, created_by: ctx.userId,
    });
    await insertStudyRevision(trx, {
      organisation_id: organisationId, study_id: at.studyId, revision: 1, case_id: bound.id, case_revision: bound.case_revision,
      problem_id: bound.problem_id, problem_revision: bound.problem_revision, rule_revision: builtInRule.revision, state_since: now,
      plan_frozen_at: input.grids.some(isTyped) ? now : null, created_by: ctx.userId,
    });
    await insertGrids(trx, input.grids.map(({ label, ...definition }) => ({
      organisation_id: organisationId, id: newId(), study_id: at.studyId, study_revision: 1, label, definition: json(definition),
      state: isTyped(definition) ? 'typed' : 'expected',
    })));
    await settleStudy(trx, at, now);
    return mapStudy(ctx, trx, await requireStudy(ctx, trx, at.studyId));
  });
}
