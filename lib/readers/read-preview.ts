import { createJsonColumns } from './json-columns';
import { openPlainBytes } from './plain-bytes';
import { readHead } from './read-head';
import { createReasonCollector } from './reason-collector';
import { sniffFormat } from './sniff-format';
import type { ByteSource, SourcePreview } from './source';
import { detectTableDialect } from './table-dialect';

const shownRows = 10;
/** A value is shown so far, in bytes. */
const shownBytes = 200;

/**
 * The header and first rows of a file. Of a table only the beginning is read; of JSON all of it, since its columns stand
 * one after another. Throws RejectedFile for a file that holds no columns.
 */
export async function readPreview(source: ByteSource): Promise<SourcePreview> {
  const { compressed, chunks } = await openPlainBytes(source);
  try {
    const head = await readHead(chunks);
    if (sniffFormat(head) === 'json') return { compressed, ...await previewJson(head.bytes, chunks) };
    const { delimiter, hasHeader, header, firstRows } = detectTableDialect(head);
    return { format: 'table', compressed, delimiter, hasHeader, header, firstRows };
  } finally {
    await chunks.return();
  }
}

async function previewJson(head: Buffer, rest: AsyncIterable<Buffer>): Promise<Omit<SourcePreview, 'compressed'>> {
  const first: string[][] = [];
  const columns = createJsonColumns(() => {
    const values: string[] = [];
    first.push(values);
    return (kind, bytes, from, to) => {
      if (values.length < shownRows) values.push(kind === 'list' ? '[ … ]' : bytes.toString('utf8', from, Math.min(to, from + shownBytes)));
    };
  }, createReasonCollector());
  columns.push(head[0] === 0xef ? head.subarray(3) : head);
  for await (const chunk of rest) columns.push(chunk);
  columns.end();
  const rows = Math.max(0, ...first.map((values) => values.length));
  const firstRows = Array.from({ length: rows }, (_, row) => first.map((values) => values[row] ?? ''));
  return { format: 'json', delimiter: null, hasHeader: true, header: [...columns.header()], firstRows };
}
