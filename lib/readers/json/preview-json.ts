import type { ColumnsPreview } from '../column-format';
import { createReasonCollector } from '../reason-collector';
import { createJsonColumns } from './json-columns';

const shownRows = 10;
/** A value is shown so far, in bytes. */
const shownBytes = 200;

/** The columns of JSON and their first rows. All of it is read, since columns stand one after another. */
export async function previewJson(pieces: AsyncIterable<Buffer>): Promise<ColumnsPreview> {
  const first: string[][] = [];
  const columns = createJsonColumns(() => {
    const values: string[] = [];
    first.push(values);
    return (kind, bytes, from, to) => {
      if (values.length < shownRows) values.push(kind === 'list' ? '[ … ]' : bytes.toString('utf8', from, Math.min(to, from + shownBytes)));
    };
  }, createReasonCollector());
  for await (const piece of pieces) columns.push(piece);
  columns.end();
  const rows = Math.max(0, ...first.map((values) => values.length));
  const firstRows = Array.from({ length: rows }, (_, row) => first.map((values) => values[row] ?? ''));
  return { delimiter: null, hasHeader: true, header: [...columns.header()], firstRows };
}
