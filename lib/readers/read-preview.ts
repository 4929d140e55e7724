import { readSource } from './read-source';
import type { ByteSource, SourcePreview } from './source';
import { detectTableDialect } from './table/table-dialect';

/**
 * The header and first rows of a file. Of a table only the beginning is read, of other formats as much as they need.
 * Throws RejectedFile for a file that holds no columns.
 */
export async function readPreview(source: ByteSource): Promise<SourcePreview> {
  return readSource<SourcePreview>(source, {
    table({ head, compressed }) {
      const { delimiter, hasHeader, header, firstRows } = detectTableDialect(head);
      return Promise.resolve({ format: 'table', compressed, delimiter, hasHeader, header, firstRows });
    },
    columns: async (reader, { pieces, format, compressed }) => ({ format, compressed, ...await reader.preview(pieces) }),
  });
}
