import { insertAssessment } from '@/db/queries/assessments';
import { listGrids, type GridRow } from '@/db/queries/grids';
import { findStudy, type StudyHead } from '@/db/queries/studies';
import { findBoundRevision, updateRevisionState, type BoundRevision, type RevisionKey } from '@/db/queries/study-revisions';
import { json } from '@/db/json';
import type { Assessment } from '@/lib/domain/assessment/schema';
import { spaceTimeSeries } from '@/lib/domain/assessment/space-time-series';
import { studySeries } from '@/lib/domain/assessment/study-series';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import { domainVolume } from '@/lib/domain/problems/domain-volume';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { refinementSchema } from '@/lib/domain/studies/input';
import { assessSeries } from '@/lib/numerics/assess-series';
import { numericsVersion } from '@/lib/numerics/version';
import { newId } from '../keys';
import type { JobContext } from '../outbox/job-context';
import { announce } from '../studies/announce';
import { definitionOf, normsOf } from '../studies/grid-definition';
import { withOrganisation } from '../with-organisation';
import { hashInputs } from './hash-inputs';
import { queueFailMails } from './queue-fail-mails';

interface LoadedInputs { head: StudyHead; bound: BoundRevision; rows: GridRow[] }
type Computed = { ok: true; assessment: Assessment } | { ok: false; reason: string };

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

function compute(loaded: LoadedInputs): Computed {
  const { head, bound, rows } = loaded;
  const dimension = head.dimension;
  const used = rows.filter((row) => row.excluded === null);
  try {
    const problem = problemDefinitionSchema.parse(bound.problem_definition);
    const study = {
      definition: caseDefinitionSchema.parse(bound.case_definition),
      grids: used.map((row) => ({ grid: { label: row.label, ...definitionOf(row) }, norms: normsOf(row) })),
      dimension, volume: domainVolume(problem, dimension),
    };
    const refinement = refinementSchema.parse(head.refinement);
    const series = refinement === 'space-time' ? spaceTimeSeries(study) : studySeries({ ...study, refinement, box: problem.domain ?? null });
    if (!series.ok) return series;
    const inputs = used.flatMap((row) => {
      const norms = normsOf(row);
      return norms ? [{ label: row.label, sha256: row.sha256 ?? '', bytes: Number(row.bytes ?? 0), rows: norms.rows, weightSum: norms.equalWeights ? null : norms.weightSum }] : [];
    });
    return { ok: true, assessment: { ...assessSeries(series), inputs, inputsSha256: inputsSha256(loaded) } };
  } catch (error) {
    if (error instanceof RangeError || error instanceof TypeError) return { ok: false, reason: error.message };
    throw error;
  }
}

/** Computes the outcome of a revision that waits for it and keeps it for good; a second run finds it done. */
export async function assessStudy(ctx: JobContext, studyId: string, revision: number): Promise<void> {
  const at: RevisionKey = { organisationId: ctx.organisation.id, studyId, revision };
  const loaded = await withOrganisation(ctx, async (trx) => {
    const head = await findStudy(trx, ctx.organisation.id, studyId);
    const bound = await findBoundRevision(trx, at);
    return head && bound?.state === 'assessing' ? { head, bound, rows: await listGrids(trx, at) } : null;
  });
  if (!loaded) return;
  const computed = compute(loaded);
  const now = ctx.clock();
  const isChanged = await withOrganisation(ctx, async (trx) => {
    if (!computed.ok) return updateRevisionState(trx, at, ['assessing'], { state: 'assessment-failed', failure: computed.reason, since: now });
    const { assessment } = computed;
    await insertAssessment(trx, {
      organisation_id: ctx.organisation.id, id: newId(), study_id: studyId, study_revision: revision, outcome: assessment.outcome,
      body: json(assessment), inputs_sha256: assessment.inputsSha256, numerics_version: assessment.numericsVersion,
    });
    const isFirst = await updateRevisionState(trx, at, ['assessing'], { state: 'assessed', since: now });
    if (isFirst && assessment.outcome === 'fail') await queueFailMails(ctx, trx, { at, head: loaded.head, caseName: loaded.bound.case_name, assessment });
    return isFirst;
  });
  if (isChanged) await announce(ctx, studyId, { event: 'state', state: computed.ok ? 'assessed' : 'assessment-failed' });
}
