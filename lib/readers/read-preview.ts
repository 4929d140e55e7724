import type { GivenDialect } from '../domain/columns/given-dialect';
import { previewHead } from './preview-table';
import { readSource } from './read-source';
import type { ByteSource, SourcePreview } from './source';

/**
 * The header and first rows of a file, a text table as was given. Of a table only the beginning is read, of other formats as much as they need.
 * Throws RejectedFile for a file that holds no columns.
 */
export async function readPreview(source: ByteSource, given: GivenDialect = {}): Promise<SourcePreview> {
  return readSource<SourcePreview>(source, {
    table: ({ head, compressed }) => Promise.resolve(previewHead(head, compressed, given)),
    columns: async (reader, { pieces, format, compressed }) => ({ format, compressed, ...await reader.preview(pieces) }),
  });
}
