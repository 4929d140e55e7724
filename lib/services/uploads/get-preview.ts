import { isDeepStrictEqual } from 'node:util';
import type { ColumnMapping } from '@/lib/domain/columns/column-mapping';
import { refuseDialect, type GivenDialect } from '@/lib/domain/columns/given-dialect';
import { describeTable } from '@/lib/domain/uploads/dialect-text';
import { describeRejection } from '@/lib/domain/uploads/rejection-text';
import type { PreviewQuery, UploadPreview } from '@/lib/domain/uploads/schema';
import { AppError } from '@/lib/errors';
import { previewTable } from '@/lib/readers/preview-table';
import { RejectedFile } from '@/lib/readers/rejected-file';
import type { SourcePreview } from '@/lib/readers/source';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { mapColumns } from '../reading/map-columns';
import { requireStudy } from '../studies/require-study';
import { withOrganisation } from '../with-organisation';
import { requireUpload } from './require-upload';

const storagePatience = 8000;

function tableOf({ format, delimiter, hasHeader, headerLine, decimalMark, given }: SourcePreview): UploadPreview['table'] {
  if (format !== 'table') return null;
  return {
    delimiter: delimiter ?? 'white space', hasHeader, headerLine: hasHeader ? (headerLine ?? null) : null, decimalMark: decimalMark ?? null, given: given ?? {},
  };
}

const formatNames: Readonly<Record<SourcePreview['format'], string>> = { table: 'Text table', json: 'JSON', hdf5: 'HDF5', vtk: 'VTK XML' };

function describeDialect(preview: SourcePreview): string {
  const table = tableOf(preview);
  return `${table ? describeTable(table) : formatNames[preview.format]}${preview.compressed ? ', gzip-compressed' : ''}`;
}

/** What of the dialect is said by the call, null where it says nothing. */
function saidBy({ delimiter, header, decimal }: PreviewQuery): GivenDialect | null {
  if (delimiter === undefined && header === undefined && decimal === undefined) return null;
  return {
    ...(delimiter !== undefined && delimiter !== 'auto' && { delimiter }),
    ...(header !== undefined && header !== 'auto' && { hasHeader: header === 'yes' }),
    ...(decimal !== undefined && decimal !== 'auto' && { decimalMark: decimal }),
  };
}

function requireDialect(given: GivenDialect): void {
  const fault = refuseDialect(given);
  if (fault !== null) throw new AppError('invalid', fault, { fields: [{ path: 'decimal', message: fault }] });
}

/** The beginning of the stored file, read as a table written so. */
async function lookAgain(ctx: MemberContext, storageKey: string, given: GivenDialect): Promise<SourcePreview> {
  try {
    return await previewTable(await ctx.storage.read(storageKey, AbortSignal.timeout(storagePatience)), given);
  } catch (error) {
    if (!(error instanceof RejectedFile)) throw error;
    throw new AppError('invalid', error.reasons.map((reason) => describeRejection(reason).sentence).join(' '), { cause: error });
  }
}

/** Header and first rows of a file that was looked into, with what its columns are taken for; a text table also as the query has it. */
export async function getPreview(ctx: MemberContext, id: string, query: PreviewQuery = {}): Promise<UploadPreview> {
  permit(ctx, 'work.read');
  const said = saidBy(query);
  const { upload, kept, of } = await withOrganisation(ctx, async (trx) => {
    const { upload, grid } = await requireUpload(ctx, trx, id);
    const kept = upload.preview as unknown as SourcePreview | null;
    if (!kept) throw new AppError('wrong-state', `The file has not been looked into; grid ${grid.label} is ${grid.state}.`);
    const { head, bound } = await requireStudy(ctx, trx, grid.study_id, grid.study_revision);
    return { upload, kept, of: { mapping: head.case_columns as unknown as ColumnMapping | null, bound, grid } };
  });
  requireDialect(said ?? {});
  const wanted = said ?? of.mapping?.table ?? {};
  const preview = kept.format !== 'table' || isDeepStrictEqual(wanted, kept.given ?? {}) ? kept : await lookAgain(ctx, upload.storage_key, wanted);
  const { found, missing } = mapColumns(preview.header, of);
  return {
    format: preview.format, dialect: describeDialect(preview), table: tableOf(preview),
    header: preview.header, firstRows: preview.firstRows, mapping: of.mapping, proposal: found, missing,
  };
}
