import { Fragment } from 'react';
import { Cell, HeadCell } from '@/app/_components/tables/cells';
import { Head, Row, Table } from '@/app/_components/tables/table';
import type { UploadPreview } from '@/lib/domain/uploads/schema';

const shownRows = 4;
const shownColumns = 50;

/** A name that may be a path, broken where its parts meet. */
function ColumnName({ name }: { name: string }) {
  return name.split(/(?<=[/._])/).map((part, index) => <Fragment key={index}>{index > 0 && <wbr />}{part}</Fragment>);
}

/** Where the first row is not as wide as the header, one of the two is not what it seems. */
function WidthNote({ preview: { header, firstRows, table } }: { preview: UploadPreview }) {
  const [first] = firstRows;
  // A separator at the end of the rows parts nothing.
  const width = first?.at(-1) === '' ? first.length - 1 : first?.length;
  if (table === null || width === undefined || width === header.length || first?.length === header.length) return null;
  return (
    <p role="status" className="mt-2 text-note">
      <b>{width} {width === 1 ? 'value' : 'values'} in the first row, {header.length} {header.length === 1 ? 'name' : 'names'}.</b>{' '}
      {table.delimiter === 'comma' && width === 2 * header.length
        ? 'If commas are the decimal mark, something else must part the columns: “1,5,2,5” could be two numbers or four. Write the table with semicolons.'
        : 'Say below what parts the columns, or which line names them.'}
    </p>
  );
}

/** The first rows of a file under the names of its columns. */
export function PreviewTable({ preview, filename }: { preview: UploadPreview; filename: string }) {
  const { header, firstRows, dialect } = preview;
  const more = header.length - shownColumns;
  return (
    <>
      <Table caption={<>The first rows of <span className="break-all">{filename}</span>. {dialect}.{more > 0 && ` The first ${shownColumns} of ${header.length} columns.`}</>}>
        <Head>
          <tr>{header.slice(0, shownColumns).map((column, index) => <HeadCell key={`${column} ${index}`} num className="max-w-56 min-w-12 [overflow-wrap:anywhere]"><ColumnName name={column} /></HeadCell>)}</tr>
        </Head>
        <tbody>
          {firstRows.slice(0, shownRows).map((row, index) => (
            <Row key={index}>{row.slice(0, shownColumns).map((cell, column) => <Cell key={column} num>{cell}</Cell>)}</Row>
          ))}
        </tbody>
      </Table>
      <WidthNote preview={preview} />
    </>
  );
}
