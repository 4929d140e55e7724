import type { QuickCheckInput } from '@/lib/domain/assessment/quick-schema';
import { formatMeasure } from '@/lib/domain/numbers/format-measure';
import { formatOrder } from '@/lib/domain/numbers/format-order';
import { formatPercent } from '@/lib/domain/numbers/format-percent';
import { formatValue } from '@/lib/domain/numbers/format-value';
import type { QuantityAssessment } from '@/lib/numerics/assessment';
import { Cell, HeadCell, Missing, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { FormulaText } from '../ui/formula-text';
import { assessTriples } from './triple-rows';

function Shown({ value, as, why }: { value: number | null; as: (value: number) => string; why: string }) {
  return value === null ? <Missing reason={why} /> : <FormulaText text={as(value)} />;
}

/** Order, extrapolated value and grid convergence index from each three grids. */
export function ValueTable({ input, quantity }: { input: QuickCheckInput; quantity: QuantityAssessment }) {
  const rows = assessTriples(input, quantity);
  const shown = rows.length === 0 ? [quantity] : rows;
  return (
    <Table number={1} caption={rows.length === 0 ? 'From two grids and the formal order.' : 'From each three grids, the finest three first.'}>
      <Head>
        <tr>
          <HeadCell>Grids</HeadCell><HeadCell>Convergence</HeadCell><HeadCell num>Order observed</HeadCell><HeadCell num>Order used</HeadCell>
          <HeadCell num>Extrapolated</HeadCell><HeadCell num>Relative change</HeadCell><HeadCell num>GCI</HeadCell><HeadCell num>GCI, in unit</HeadCell>
        </tr>
      </Head>
      <tbody>
        {shown.map((row) => (
          <Row key={row.values.map(({ label }) => label).join(' ')}>
            <RowHead className="whitespace-nowrap">{row.values.map(({ label }) => label).join(', ')}</RowHead>
            <Cell>{row.convergence?.replace('-', ', ') ?? <Missing reason="Fewer than three grids" />}</Cell>
            <Cell num><Shown value={row.orderObserved} as={(order) => formatOrder(order)} why="No order observed" /></Cell>
            <Cell num><Shown value={row.orderUsed} as={(order) => formatOrder(order)} why="No order used" /></Cell>
            <Cell num><Shown value={row.extrapolated} as={(value) => formatValue(value, row.gciAbsolute)} why="Not extrapolated" /></Cell>
            <Cell num><Shown value={row.relativeChange} as={formatPercent} why="No change to tell" /></Cell>
            <Cell num><Shown value={row.gci} as={formatPercent} why="No GCI" /></Cell>
            <Cell num><Shown value={row.gciAbsolute} as={(value) => formatMeasure(value)} why="No GCI" /></Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
