import type { ColumnMapping } from '@/lib/domain/columns/column-mapping';
import type { UploadPreview } from '@/lib/domain/uploads/schema';
import { AppError } from '@/lib/errors';
import type { SourcePreview } from '@/lib/readers/source';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { mapColumns } from '../reading/map-columns';
import { requireStudy } from '../studies/require-study';
import { withOrganisation } from '../with-organisation';
import { requireUpload } from './require-upload';

function describeDialect({ format, compressed, delimiter, hasHeader }: SourcePreview): string {
  const packed = compressed ? ', gzip-compressed' : '';
  if (format === 'json') return `JSON, columns of arrays${packed}`;
  return `Table separated by ${delimiter ?? 'white space'}, ${hasHeader ? 'with' : 'without'} a header${packed}`;
}

/** Header and first rows of a file that was looked into, with what its columns are taken for. */
export async function getPreview(ctx: MemberContext, id: string): Promise<UploadPreview> {
  permit(ctx, 'work.read');
  return withOrganisation(ctx, async (trx) => {
    const { upload, grid } = await requireUpload(ctx, trx, id);
    const preview = upload.preview as unknown as SourcePreview | null;
    if (!preview) throw new AppError('wrong-state', `The file has not been looked into; grid ${grid.label} is ${grid.state}.`);
    const { head, bound } = await requireStudy(ctx, trx, grid.study_id, grid.study_revision);
    const mapping = head.case_columns as unknown as ColumnMapping | null;
    const { found, missing } = mapColumns(preview.header, { mapping, bound, grid });
    return { format: preview.format, dialect: describeDialect(preview), header: preview.header, firstRows: preview.firstRows, mapping, proposal: found, missing };
  });
}
