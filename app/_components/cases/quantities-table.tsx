import type { CaseDefinition } from '@/lib/domain/cases/definition';
import { procedureNames } from '@/lib/domain/assessment/explain-procedure';
import { formatPercent } from '@/lib/domain/numbers/format-percent';
import { formatValue } from '@/lib/domain/numbers/format-value';
import { Cell, HeadCell, Missing, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';

export function QuantitiesTable({ quantities }: { quantities: CaseDefinition['quantities'] }) {
  return (
    <Table caption="Quantities." hideCaption>
      <Head><tr><HeadCell>Quantity</HeadCell><HeadCell>Unit</HeadCell><HeadCell num>Formal order</HeadCell><HeadCell num>Known value</HeadCell><HeadCell num>Largest GCI or U</HeadCell><HeadCell afterNumber>Procedure</HeadCell></tr></Head>
      <tbody>
        {quantities.map(({ name, unit, formalOrder, knownValue, target, procedure, uNumFactor }) => (
          <Row key={name}>
            <RowHead>{name}</RowHead>
            <Cell>{unit ?? <Missing reason="No unit" />}</Cell>
            <Cell num>{formalOrder ?? <Missing reason="No formal order" />}</Cell>
            <Cell num>{knownValue === undefined ? <Missing reason="No known value" /> : formatValue(knownValue)}</Cell>
            <Cell num>{target === undefined ? <Missing reason="No target" /> : formatPercent(target)}</Cell>
            <Cell afterNumber>{knownValue === undefined ? <>{procedureNames[procedure]}{uNumFactor !== undefined && `, k = ${uNumFactor}`}</> : <Missing reason="Judged by its error" />}</Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
