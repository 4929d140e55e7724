import type { GivenDialect } from '../domain/columns/given-dialect';
import { openPlainBytes } from './plain-bytes';
import { readHead, type Head } from './read-head';
import type { ByteSource, SourcePreview } from './source';
import { detectTableDialect, findDecimalMark } from './table/table-dialect';

/** The header and first rows of a text table by its beginning, read as was given and otherwise as found out. */
export function previewHead(head: Head, compressed: boolean, given: GivenDialect = {}): SourcePreview {
  const { delimiter, hasHeader, header, headerLine, firstRows } = detectTableDialect(head, given);
  const isGiven = Object.values(given).some((said) => said !== undefined);
  return {
    format: 'table', compressed, delimiter, hasHeader, header, firstRows, headerLine,
    decimalMark: given.decimalMark ?? findDecimalMark(firstRows), ...(isGiven && { given }),
  };
}

/** The same of a file that is known to be a text table; no more than its beginning is read. */
export async function previewTable(source: ByteSource, given: GivenDialect): Promise<SourcePreview> {
  const { compressed, chunks } = await openPlainBytes(source);
  try {
    return previewHead(await readHead(chunks), compressed, given);
  } finally {
    await chunks.return();
  }
}
