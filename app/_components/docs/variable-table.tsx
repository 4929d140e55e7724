import { Cell, HeadCell } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';

interface VariableRow { name: string; meaning: string; standard: string | null }

interface VariableTableProps { number: number; caption: string; variables: VariableRow[] }

function standardWords(standard: string | null): string {
  if (standard === null) return 'must be set';
  return standard === '' ? 'may be left out' : `unless set: ${standard}`;
}

/** Variables of the environment, with what each means and what holds where it is not set. */
export function VariableTable({ number, caption, variables }: VariableTableProps) {
  return (
    <Table number={number} caption={caption}>
      <Head><tr><HeadCell className="hidden tablet:table-cell">Variable</HeadCell><HeadCell>Meaning</HeadCell></tr></Head>
      <tbody>
        {variables.map(({ name, meaning, standard }) => (
          <Row key={name}>
            <Cell className="hidden tablet:table-cell"><code className="font-mono text-code">{name}</code></Cell>
            <Cell>
              <code className="block font-mono text-code tablet:hidden">{name}</code>
              {meaning} <span className="text-graphite">({standardWords(standard)})</span>
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
