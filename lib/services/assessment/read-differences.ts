import { findUpload } from '@/db/queries/uploads';
import { comparedGrids } from '@/lib/domain/assessment/compared-grids';
import type { GridDifference } from '@/lib/domain/assessment/study-to-assess';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import { solutionFields } from '@/lib/domain/cases/solution-fields';
import type { ColumnMapping, ReaderMapping } from '@/lib/domain/columns/column-mapping';
import { splitColumns } from '@/lib/domain/columns/split-columns';
import { domainVolume } from '@/lib/domain/problems/domain-volume';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { refinementSchema } from '@/lib/domain/studies/input';
import { describeRejection } from '@/lib/domain/uploads/rejection-text';
import { RejectedFile } from '@/lib/readers/rejected-file';
import type { JobContext } from '../outbox/job-context';
import type { GridReader, StoredFile } from '../reading/grid-reader';
import { definitionOf, normsOf } from '../studies/grid-definition';
import { withOrganisation } from '../with-organisation';
import type { LoadedInputs } from './compute-assessment';

type Row = LoadedInputs['rows'][number];
type Differences = { ok: true; differences: GridDifference[] } | { ok: false; reason: string };
interface Reading { dimension: 1 | 2 | 3; fields: string[]; reader: GridReader }

/**
 * What the solutions of successive grids differ by, for fields without an exact solution; nothing where there is none. In
 * words where two files cannot be compared. A fault of storage is thrown, so that the job runs again.
 */
export async function readDifferences(ctx: JobContext, { head, bound, rows }: LoadedInputs, reader: GridReader): Promise<Differences> {
  const definition = caseDefinitionSchema.parse(bound.case_definition);
  const problem = problemDefinitionSchema.parse(bound.problem_definition);
  const refinement = refinementSchema.parse(head.refinement);
  const used = rows.filter((row) => row.excluded === null);
  const fields = untypedFields(solutionFields(definition, problem), used);
  if (fields.length === 0 || refinement === 'space-time') return { ok: true, differences: [] };
  const pairs = comparedGrids({
    grids: used.map((row) => ({ grid: { label: row.label, ...definitionOf(row) }, norms: normsOf(row) })),
    refinement, dimension: head.dimension, volume: domainVolume(problem, head.dimension),
  });
  const differences: GridDifference[] = [];
  for (const { fine, coarse } of pairs) {
    const [fineRow, coarseRow] = [used.find(({ label }) => label === fine), used.find(({ label }) => label === coarse)];
    if (!fineRow || !coarseRow) throw new Error(`Grids ${fine} and ${coarse} are to be compared, and one is not there.`);
    const found = await readPair(ctx, { fine: fineRow, coarse: coarseRow }, { dimension: problem.dimension, fields, reader });
    if (!found.ok) return found;
    differences.push({ fine, coarse, fields: found.fields });
  }
  return { ok: true, differences };
}

/** Errors that were typed go before solutions in files. */
function untypedFields(fields: readonly string[], rows: readonly Row[]): string[] {
  return fields.filter((field) => rows.every((row) => definitionOf(row).errors?.[field] === undefined));
}

async function readPair(ctx: JobContext, { fine, coarse }: { fine: Row; coarse: Row }, { reader, dimension, fields }: Reading): Promise<{ ok: true; fields: GridDifference['fields'] } | { ok: false; reason: string }> {
  const files = { fine: await fileOf(ctx, fine), coarse: await fileOf(ctx, coarse) };
  try {
    const result = await reader.difference(files, { dimension, fields, fine: mappingOf(fine, fields, dimension), coarse: mappingOf(coarse, fields, dimension) });
    for (const row of [fine, coarse]) {
      const found = result.sha256[row === fine ? 'fine' : 'coarse'];
      if (row.sha256 !== found) throw new Error(`Storage gave a file with SHA-256 ${found}; ${row.sha256 ?? 'none'} was read before.`);
    }
    return { ok: true, fields: result.fields };
  } catch (error) {
    if (!(error instanceof RejectedFile)) throw error;
    const told = error.reasons.map(describeRejection).map(({ sentence, nextStep }) => `${sentence} ${nextStep}`);
    return { ok: false, reason: `Grids ${fine.label} and ${coarse.label} cannot be compared. ${told.join(' ')}` };
  }
}

async function fileOf(ctx: JobContext, row: Row): Promise<StoredFile> {
  const upload = row.upload_id === null ? undefined : await withOrganisation(ctx, (trx) => findUpload(trx, ctx.organisation.id, row.upload_id ?? ''));
  if (!upload) throw new Error(`Grid ${row.label} was read, and its file is not there.`);
  return { storageKey: upload.storage_key, bytes: Number(upload.bytes) };
}

function mappingOf(row: Row, fields: readonly string[], dimension: number): ReaderMapping {
  const mapping = row.mapping as unknown as ColumnMapping;
  return { ...mapping, fields: Object.fromEntries(fields.flatMap((field) => {
    const { value } = splitColumns(mapping.fields[field], dimension);
    return value === undefined ? [] : [[field, value]];
  })) };
}
