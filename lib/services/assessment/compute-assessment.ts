import type { GridRow } from '@/db/queries/grids';
import type { StudyHead } from '@/db/queries/studies';
import type { BoundRevision } from '@/db/queries/study-revisions';
import type { GridDifference } from '@/lib/domain/assessment/study-to-assess';
import type { Assessment } from '@/lib/domain/assessment/schema';
import { spaceTimeSeries } from '@/lib/domain/assessment/space-time-series';
import { studySeries } from '@/lib/domain/assessment/study-series';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import { domainVolume } from '@/lib/domain/problems/domain-volume';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { refinementSchema } from '@/lib/domain/studies/input';
import { assessSeries } from '@/lib/numerics/assess-series';
import { numericsVersion } from '@/lib/numerics/version';
import { meshFacts } from '../studies/mesh-facts';
import { definitionOf, normsOf } from '../studies/grid-definition';
import { hashInputs } from './hash-inputs';

/** A revision with its grids, as it is assessed. */
export interface LoadedInputs { head: StudyHead; bound: BoundRevision; rows: GridRow[] }
export type Computed = { ok: true; assessment: Assessment } | { ok: false; reason: string };

/** All that the outcome depends on, so that the same inputs can be told to be the same. */
function inputsSha256({ head, bound, rows }: LoadedInputs): string {
  return hashInputs({
    grids: [...rows].sort((left, right) => (left.label < right.label ? -1 : 1)).map((row) => {
      const { h, cells, cellsPerDirection, dt, t, values, errors, iterativeError, run } = definitionOf(row);
      return {
        label: row.label, h, cells, cellsPerDirection, dt, t, values, errors, iterativeError, precision: run?.precision,
        excluded: row.excluded, upload: row.excluded === null ? row.sha256 : null, columns: row.mapping,
      };
    }),
    refinement: head.refinement, dimension: head.dimension,
    case: { id: head.case_id, revision: bound.case_revision }, problem: { id: bound.problem_id, revision: bound.problem_revision },
    rule: { revision: bound.rule_revision }, numericsVersion,
  });
}

/** The outcome of a revision from its grids' norms, what its solutions differ by and what was typed, or in words why there is none. */
export function computeAssessment(loaded: LoadedInputs, differences: readonly GridDifference[] = []): Computed {
  const { head, bound, rows } = loaded;
  const dimension = head.dimension;
  const used = rows.filter((row) => row.excluded === null);
  try {
    const problem = problemDefinitionSchema.parse(bound.problem_definition);
    const study = {
      definition: caseDefinitionSchema.parse(bound.case_definition),
      grids: used.map((row) => ({ grid: { label: row.label, ...definitionOf(row) }, norms: normsOf(row) })),
      dimension, volume: domainVolume(problem, dimension), differences,
    };
    const refinement = refinementSchema.parse(head.refinement);
    const series = refinement === 'space-time' ? spaceTimeSeries(study) : studySeries({ ...study, refinement, box: problem.domain ?? null });
    if (!series.ok) return series;
    const inputs = used.flatMap((row) => {
      const norms = normsOf(row);
      return norms ? [{ label: row.label, sha256: row.sha256 ?? '', bytes: Number(row.bytes ?? 0), rows: norms.rows, weightSum: norms.equalWeights ? null : norms.weightSum, ...(norms.mesh && { mesh: meshFacts(norms.mesh) }) }] : [];
    });
    return { ok: true, assessment: { ...assessSeries(series), inputs, inputsSha256: inputsSha256(loaded) } };
  } catch (error) {
    if (error instanceof RangeError || error instanceof TypeError) return { ok: false, reason: error.message };
    throw error;
  }
}
