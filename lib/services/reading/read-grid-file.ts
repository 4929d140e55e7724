import { isDeepStrictEqual } from 'node:util';
import { lockCaseColumns } from '@/db/queries/cases';
import { upsertGridResult } from '@/db/queries/grid-results';
import { replaceGridMaps } from '@/db/queries/grid-maps';
import { updateGrid } from '@/db/queries/grids';
import { updateRevisionFailure } from '@/db/queries/study-revisions';
import { updateUpload } from '@/db/queries/uploads';
import { json } from '@/db/json';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import type { ColumnMapping } from '@/lib/domain/columns/column-mapping';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import type { GridState } from '@/lib/domain/studies/schema';
import type { RejectionReason } from '@/lib/domain/uploads/rejection';
import { numericsVersion } from '@/lib/numerics/version';
import type { GridReadResult } from '@/lib/readers/read-grid';
import { RejectedFile } from '@/lib/readers/rejected-file';
import { enqueueJob } from '../outbox/enqueue-job';
import type { JobContext } from '../outbox/job-context';
import { announce } from '../studies/announce';
import { definitionOf } from '../studies/grid-definition';
import { settleStudy } from '../studies/settle-study';
import { withOrganisation } from '../with-organisation';
import { beginReading, whileReading, type Reading } from './begin-reading';
import type { GridReader } from './grid-reader';
import { mapColumns } from './map-columns';
import { mapRow } from './map-row';
import { readNorms } from './read-norms';
import { reportProgress } from './report-progress';

function tellState(ctx: JobContext, { grid }: Reading, gridState: GridState): Promise<void> {
  return announce(ctx, grid.study_id, { event: 'state', state: 'collecting', grid: grid.label, gridState });
}

async function reject(ctx: JobContext, reading: Reading, reasons: RejectionReason[]): Promise<void> {
  const isHeard = await whileReading(ctx, reading, async (trx) => {
    await updateGrid(trx, ctx.organisation.id, reading.grid.id, { state: 'rejected', reasons: json(reasons) });
    await updateRevisionFailure(trx, reading.at, null);
  });
  if (isHeard) await tellState(ctx, reading, 'rejected');
}

async function keepResult(ctx: JobContext, reading: Reading, mapping: ColumnMapping, { norms, maps, sha256 }: GridReadResult): Promise<void> {
  const { grid, upload, at } = reading;
  let isSettled = false;
  const isHeard = await whileReading(ctx, reading, async (trx) => {
    await updateGrid(trx, ctx.organisation.id, grid.id, { state: 'read', rows_read: norms.rows, reasons: json([]) });
    await updateUpload(trx, ctx.organisation.id, upload.id, { sha256 });
    await upsertGridResult(trx, {
      organisation_id: ctx.organisation.id, grid_id: grid.id, upload_id: upload.id, mapping: json(mapping), norms: json(norms),
      numerics_version: numericsVersion, created_at: ctx.clock(),
    });
    await replaceGridMaps(trx, ctx.organisation.id, grid.id, maps.map(mapRow));
    await updateRevisionFailure(trx, at, null);
    isSettled = await settleStudy(trx, at, ctx.clock());
  });
  if (!isHeard) return;
  await tellState(ctx, reading, 'read');
  if (isSettled) await announce(ctx, grid.study_id, { event: 'state', state: 'assessing' });
}

/** Looks into the file and finds its columns; null where some are missing and the grid now waits for them. */
async function findMapping(ctx: JobContext, reading: Reading, reader: GridReader): Promise<ColumnMapping | null> {
  const { upload, head, bound, grid } = reading;
  const columns = head.case_columns as unknown as ColumnMapping | null;
  const preview = await reader.preview(upload.storage_key, columns?.table ?? {});
  await withOrganisation(ctx, (trx) => updateUpload(trx, ctx.organisation.id, upload.id, { preview: json(preview) }));
  const { mapping } = mapColumns(preview.header, { mapping: columns, bound, grid });
  if (mapping) return mapping;
  let state: GridState = 'needs-columns';
  const isHeard = await whileReading(ctx, reading, async (trx) => {
    // Columns mapped since the reading began have resumed only grids that waited by then: this one resumes itself.
    const now = await lockCaseColumns(trx, ctx.organisation.id, head.case_id);
    if (!isDeepStrictEqual(now, head.case_columns)) state = 'stored';
    await updateGrid(trx, ctx.organisation.id, grid.id, { state, rows_read: null });
    if (state === 'stored') await enqueueJob(trx, { organisationId: ctx.organisation.id, job: 'grid.read', subjectId: grid.id, subjectRevision: null });
  });
  if (isHeard) await tellState(ctx, reading, state);
  return null;
}

/**
 * Reads the file of a grid into norms. What is wrong with the file is kept as reasons; what is wrong with a service is
 * thrown, so that the job runs again.
 */
export async function readGridFile(ctx: JobContext, gridId: string, reader: GridReader): Promise<void> {
  const reading = await beginReading(ctx, gridId);
  if (!reading) return;
  await tellState(ctx, reading, 'reading');
  try {
    const mapping = await findMapping(ctx, reading, reader);
    if (!mapping) return;
    const onProgress = reportProgress(ctx, reading);
    const { bound, grid, upload, head } = reading;
    const result = await readNorms({
      definition: caseDefinitionSchema.parse(bound.case_definition), problem: problemDefinitionSchema.parse(bound.problem_definition), mapping,
      grid: definitionOf(grid), seenAs: head.dimension, statedSha256: upload.stated_sha256,
    }, (asked) => reader.read({ storageKey: upload.storage_key, bytes: Number(upload.bytes) }, asked, onProgress));
    // As it was when it was received or last read: other bytes are a fault of storage, and not to be believed.
    if (upload.sha256 !== null && upload.sha256 !== result.sha256) throw new Error(`Storage gave a file with SHA-256 ${result.sha256}; ${upload.sha256} was stored.`);
    await keepResult(ctx, reading, mapping, result);
  } catch (error) {
    if (!(error instanceof RejectedFile)) throw error;
    await reject(ctx, reading, error.reasons);
  }
}
