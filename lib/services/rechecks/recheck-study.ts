import { findAssessment } from '@/db/queries/assessments';
import { listGrids, type GridRow } from '@/db/queries/grids';
import { findRecheck, finishRecheck } from '@/db/queries/rechecks';
import { findStudy, type StudyHead } from '@/db/queries/studies';
import { findBoundRevision, type BoundRevision } from '@/db/queries/study-revisions';
import { findUpload } from '@/db/queries/uploads';
import { json } from '@/db/json';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import type { ColumnMapping } from '@/lib/domain/columns/column-mapping';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { compareResults, type ResultDifference } from '@/lib/numerics/reproduction/compare-results';
import { RejectedFile } from '@/lib/readers/rejected-file';
import { computeAssessment, type Computed, type LoadedInputs } from '../assessment/compute-assessment';
import { readDifferences } from '../assessment/read-differences';
import type { JobContext } from '../outbox/job-context';
import type { GridReader } from '../reading/grid-reader';
import { readNorms } from '../reading/read-norms';
import { definitionOf } from '../studies/grid-definition';
import { withOrganisation } from '../with-organisation';

interface ReadAgain { row: GridRow; differences: ResultDifference[] }

/** What the file of a grid comes to now, in the place of what it came to before; a grid without a file stays as typed. */
async function readAgain(ctx: JobContext, row: GridRow, { head, bound, reader }: { head: StudyHead; bound: BoundRevision; reader: GridReader }): Promise<ReadAgain> {
  const { upload_id: uploadId, norms, mapping } = row;
  if (uploadId === null || norms === null || mapping === null || row.excluded !== null) return { row, differences: [] };
  const upload = await withOrganisation(ctx, (trx) => findUpload(trx, ctx.organisation.id, uploadId));
  const path = `grids.${row.label}`;
  if (!upload) return { row: { ...row, norms: null }, differences: [{ path, before: row.sha256, after: null }] };
  try {
    const result = await readNorms({
      definition: caseDefinitionSchema.parse(bound.case_definition), problem: problemDefinitionSchema.parse(bound.problem_definition),
      mapping: mapping as unknown as ColumnMapping, grid: definitionOf(row), seenAs: head.dimension, statedSha256: null,
    }, (reading) => reader.read({ storageKey: upload.storage_key, bytes: Number(upload.bytes) }, reading, () => undefined));
    const differences = result.sha256 === row.sha256 ? [] : [{ path: `${path}.sha256`, before: row.sha256, after: result.sha256 }];
    return { row: { ...row, norms: JSON.parse(JSON.stringify(result.norms)) as GridRow['norms'] }, differences };
  } catch (error) {
    if (!(error instanceof RejectedFile)) throw error;
    return { row: { ...row, norms: null }, differences: [{ path, before: 'read', after: `rejected: ${error.reasons[0]?.code ?? ''}` }] };
  }
}

/** Reads the stored files of a study again, computes its result anew and keeps how the two compare. A second run finds it done. */
export async function recheckStudy(ctx: JobContext, id: string, reader: GridReader): Promise<void> {
  const organisationId = ctx.organisation.id;
  const loaded = await withOrganisation(ctx, async (trx) => {
    const recheck = await findRecheck(trx, organisationId, id);
    if (recheck?.state !== 'running') return null;
    const at = { organisationId, studyId: recheck.study_id, revision: recheck.study_revision };
    const [head, bound, kept] = [await findStudy(trx, organisationId, at.studyId), await findBoundRevision(trx, at), await findAssessment(trx, at)];
    return head && bound && kept ? { head, bound, kept: kept.body, rows: await listGrids(trx, at) } : null;
  });
  if (!loaded) return;
  const { head, bound, kept, rows } = loaded;
  const read: ReadAgain[] = [];
  for (const row of rows) read.push(await readAgain(ctx, row, { head, bound, reader }));
  const compared = compare({ head, bound, rows }, { kept, read, after: await assessAgain(ctx, { head, bound, rows: read.map(({ row }) => row) }, reader) });
  await withOrganisation(ctx, (trx) => finishRecheck(trx, organisationId, id, {
    result: compared.result, largest_difference: compared.largestDifference, differences: json(compared.differences), finished_at: ctx.clock(),
  }));
}

async function assessAgain(ctx: JobContext, loaded: LoadedInputs, reader: GridReader): Promise<Computed> {
  const found = await readDifferences(ctx, loaded, reader);
  return found.ok ? computeAssessment(loaded, found.differences) : found;
}

function compare(before: LoadedInputs, { kept, read, after }: { kept: unknown; read: readonly ReadAgain[]; after: Computed }) {
  const norms = (rows: readonly GridRow[]) => Object.fromEntries(rows.map((row) => [row.label, row.norms]));
  const found = compareResults(
    { grids: norms(before.rows), assessment: results(kept) },
    { grids: norms(read.map(({ row }) => row)), assessment: results(after.ok ? after.assessment : { outcome: after.reason }) },
  );
  const differences = [...read.flatMap((each) => each.differences), ...found.differences].slice(0, 20);
  return { ...found, differences, result: differences.length > 0 ? 'not-reproduced' as const : found.result };
}

/** What was found, without what names the inputs and the version it was found by. */
function results(assessment: unknown): unknown {
  const kept = { ...(assessment as Record<string, unknown>) };
  for (const name of ['inputsSha256', 'numericsVersion', 'patterns']) delete kept[name];
  return JSON.parse(JSON.stringify(kept)) as unknown;
}
