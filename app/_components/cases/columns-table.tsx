import { describeGiven } from '@/lib/domain/uploads/dialect-text';
import type { ColumnMapping } from '@/lib/domain/columns/column-mapping';
import { Cell, HeadCell, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { Sym } from '../ui/symbols';

const coordinates = ['x', 'y', 'z', 't', 'dx', 'dy', 'dz', 'distance', 'flag'] as const;

/** Which column of the output is what. */
export function ColumnsTable({ columns }: { columns: ColumnMapping }) {
  const rows = [
    ...coordinates.flatMap((name) => (columns[name] === undefined ? [] : [{ name, column: columns[name] }])),
    ...Object.entries(columns.fields).map(([name, column]) => ({ name, column: [column].flat().join(', ') })),
  ];
  return (
    <Table caption="Columns of solver output." hideCaption>
      <Head><tr><HeadCell>Stands for</HeadCell><HeadCell>Column</HeadCell></tr></Head>
      <tbody>
        {rows.map(({ name, column }) => <Row key={name}><RowHead><Sym>{name}</Sym></RowHead><Cell><code className="font-mono text-code">{column}</code></Cell></Row>)}
        {columns.table && <Row><RowHead>text tables</RowHead><Cell>{describeGiven(columns.table)}</Cell></Row>}
        <Row><RowHead>weight</RowHead><Cell>{columns.weight === null ? 'equal for every row' : <code className="font-mono text-code">{columns.weight}</code>}</Cell></Row>
      </tbody>
    </Table>
  );
}
