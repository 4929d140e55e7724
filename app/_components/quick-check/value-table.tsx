import { estimatedBand } from '@/lib/domain/assessment/estimated-band';
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

/** Order, extrapolated value and uncertainty from each three grids, or from all by a fit. */
export function ValueTable({ input, quantity }: { input: QuickCheckInput; quantity: QuantityAssessment }) {
  const isFitted = quantity.procedure === 'least-squares';
  const rows = isFitted ? [] : assessTriples(input, quantity);
  const { name } = estimatedBand(quantity);
  const shown = rows.length === 0 ? [quantity] : rows;
  return (
    <Table number={1} caption={isFitted ? 'From all grids.' : rows.length === 0 ? 'From two grids and the formal order.' : 'From each three grids, the finest three first.'}>
      <Head>
        <tr>
          <HeadCell>Grids</HeadCell><HeadCell>Convergence</HeadCell><HeadCell num>Order observed</HeadCell><HeadCell num>Order used</HeadCell>
          <HeadCell num>Extrapolated</HeadCell><HeadCell num>Relative change</HeadCell><HeadCell num>{name}</HeadCell><HeadCell num>{name}, in unit</HeadCell>
        </tr>
      </Head>
      <tbody>
        {shown.map((row) => (
          <Row key={row.values.map(({ label }) => label).join(' ')}>
            <RowHead className="whitespace-nowrap">{row.values.map(({ label }) => label).join(', ')}</RowHead>
            <Cell>{row.convergence?.replace('-', ', ') ?? <Missing reason="Fewer than three grids" />}</Cell>
            <Cell num><Shown value={row.orderObserved} as={(order) => formatOrder(order)} why="No order observed" /></Cell>
            <Cell num><Shown value={row.orderUsed} as={(order) => formatOrder(order)} why="No order used" /></Cell>
            <Cell num><Shown value={row.extrapolated} as={(value) => formatValue(value, estimatedBand(row).absolute)} why="Not extrapolated" /></Cell>
            <Cell num><Shown value={row.relativeChange} as={formatPercent} why="No change to tell" /></Cell>
            <Cell num><Shown value={estimatedBand(row).fraction} as={formatPercent} why={`No ${name}`} /></Cell>
            <Cell num><Shown value={estimatedBand(row).absolute} as={(value) => formatMeasure(value)} why={`No ${name}`} /></Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
