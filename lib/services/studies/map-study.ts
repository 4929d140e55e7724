import { findAssessment } from '@/db/queries/assessments';
import { listGrids, type GridRow } from '@/db/queries/grids';
import type { Assessment } from '@/lib/domain/assessment/schema';
import { caseDefinitionSchema, caseKindSchema } from '@/lib/domain/cases/definition';
import type { ColumnMapping } from '@/lib/domain/columns/column-mapping';
import { domainVolume } from '@/lib/domain/problems/domain-volume';
import { dimensionSchema, problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { refinementSchema } from '@/lib/domain/studies/input';
import { studyStateSchema, type Study } from '@/lib/domain/studies/schema';
import { statedSpacing } from '@/lib/domain/studies/stated-spacing';
import { resolveSpacing } from '@/lib/numerics/spacing/resolve-spacing';
import type { MemberContext } from '../context';
import type { Trx } from '../with-organisation';
import { definitionOf, normsOf } from './grid-definition';
import { mapGrid } from './map-grid';
import { placeInLine } from './place-in-line';
import type { LoadedStudy } from './require-study';

/** A study as it is shown, with its grids and, once there, its assessment. */
export async function mapStudy(ctx: MemberContext, trx: Trx, { head, bound, at }: LoadedStudy): Promise<Study> {
  const problemDefinition = problemDefinitionSchema.parse(bound.problem_definition);
  const dimension = dimensionSchema.parse(head.dimension);
  const refinement = refinementSchema.parse(head.refinement);
  const spacing = { refinement: refinement === 'time' ? 'time' as const : 'space' as const, dimension, volume: domainVolume(problemDefinition, dimension) };
  const assessment = await findAssessment(trx, at);
  const grids = await listGrids(trx, at);
  return {
    id: head.id,
    code: { id: head.code_id, slug: head.code_slug, name: head.code_name },
    release: { id: head.release_id, version: head.release_version, commit: head.release_commit },
    case: {
      id: head.case_id, slug: head.case_slug, name: bound.case_name, kind: caseKindSchema.parse(head.case_kind), revision: bound.case_revision,
      currentRevision: head.case_current_revision, columns: head.case_columns as unknown as ColumnMapping | null,
    },
    problem: {
      id: bound.problem_id, slug: bound.problem_slug, name: bound.problem_name, revision: bound.problem_revision,
      currentRevision: bound.problem_current_revision,
    },
    rule: { revision: bound.rule_revision },
    refinement, dimension, state: studyStateSchema.parse(bound.state), stateSince: bound.state_since.toISOString(),
    revision: bound.revision, currentRevision: head.revision, planFrozenAt: bound.plan_frozen_at?.toISOString() ?? null,
    definitionAfterData: bound.definition_after_data,
    definition: caseDefinitionSchema.parse(bound.case_definition), problemDefinition,
    grids: finestFirst(grids, spacing).map(mapGrid),
    waiting: await placeInLine(ctx, trx, grids),
    assessment: (assessment?.body ?? null) as unknown as Assessment | null,
    failure: bound.failure, createdBy: head.created_by, createdAt: head.created_at.toISOString(), revisedAt: bound.created_at.toISOString(),
  };
}

/** Grids whose spacing is not known yet come last, in the order they were made. */
function finestFirst(rows: GridRow[], spacing: { refinement: 'space' | 'time'; dimension: number; volume: number | null }): GridRow[] {
  const withSpacing = rows.map((row) => {
    const resolved = resolveSpacing({ grids: [statedSpacing({ label: row.label, ...definitionOf(row) }, normsOf(row))], ...spacing });
    return { row, h: resolved.ok ? (resolved.grids[0]?.h ?? Infinity) : Infinity, dt: definitionOf(row).dt ?? 0 };
  });
  return withSpacing.sort((left, right) => (left.h === right.h ? left.dt - right.dt : left.h - right.h)).map(({ row }) => row);
}
