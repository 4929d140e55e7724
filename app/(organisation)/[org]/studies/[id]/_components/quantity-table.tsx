import { Fragment } from 'react';
import { markOfOutcome } from '@/app/_components/studies/mark-of-outcome';
import { Cell, HeadCell, Missing, ReasonRow, RowHead } from '@/app/_components/tables/cells';
import { Head, Row, Table } from '@/app/_components/tables/table';
import { FormulaText } from '@/app/_components/ui/formula-text';
import { OutcomeWord } from '@/app/_components/ui/outcome-word';
import { estimatedBand } from '@/lib/domain/assessment/estimated-band';
import { explainProcedure } from '@/lib/domain/assessment/explain-procedure';
import { gciWithFormalOrder } from '@/lib/domain/assessment/gci-with-formal-order';
import { explainQuantity } from '@/lib/domain/assessment/reason-text';
import { formatMeasure } from '@/lib/domain/numbers/format-measure';
import { formatOrder } from '@/lib/domain/numbers/format-order';
import { formatPercent } from '@/lib/domain/numbers/format-percent';
import { formatValue } from '@/lib/domain/numbers/format-value';
import type { CaseKind } from '@/lib/domain/cases/definition';
import type { QuantityAssessment } from '@/lib/numerics/assessment';

interface QuantityTableProps { quantities: readonly QuantityAssessment[]; kind: CaseKind; number: number }

const columns = 10;
const bandNames = { GCI: 'grid convergence index (GCI)', U: 'uncertainty U' } as const;
const convergenceWords = {
  monotone: 'monotone', oscillatory: 'oscillatory', divergent: 'divergent', 'oscillatory-divergent': 'oscillatory, divergent', unchanged: 'unchanged',
} as const;

function Shown({ value, children, why }: { value: number | null; children: (value: number) => string; why: string }) {
  return value === null ? <Missing reason={why} /> : <FormulaText text={children(value)} />;
}

/** Where the quantities tend and how uncertain the finest grid is, each by its procedure. */
export function QuantityTable({ quantities, kind, number }: QuantityTableProps) {
  const bands = [...new Set(quantities.map((quantity) => estimatedBand(quantity).name))].sort();
  const band = bands.join(' or ');
  return (
    <Table number={number} caption={`Quantities, each by its procedure; the ${bands.map((name) => bandNames[name]).join(' or the ')} is that of the finest grid.`}>
      <Head>
        <tr>
          <HeadCell rowSpan={2}>Quantity</HeadCell><HeadCell rowSpan={2}>Outcome</HeadCell><HeadCell rowSpan={2}>Convergence</HeadCell>
          <HeadCell ofGroup colSpan={2}>Order</HeadCell><HeadCell rowSpan={2} num>Extrapolated</HeadCell><HeadCell rowSpan={2} num>Last change</HeadCell>
          <HeadCell ofGroup colSpan={2}>{band}</HeadCell><HeadCell rowSpan={2} num>Target</HeadCell>
        </tr>
        <tr><HeadCell num>observed</HeadCell><HeadCell num>used</HeadCell><HeadCell num>relative</HeadCell><HeadCell num>in the unit</HeadCell></tr>
      </Head>
      <tbody>
        {quantities.map((quantity) => {
          const mark = markOfOutcome(quantity.outcome, { kind, reasons: quantity.reasons });
          const estimated = estimatedBand(quantity);
          const withFormal = gciWithFormalOrder(quantity);
          return (
            <Fragment key={quantity.name}>
              <Row>
                <RowHead>{quantity.name}{quantity.unit && <span className="text-graphite">, {quantity.unit}</span>}</RowHead>
                <Cell className="whitespace-nowrap">{mark ? <OutcomeWord mark={mark} /> : <Missing reason="Not judged: no target" />}</Cell>
                <Cell>{quantity.convergence ? convergenceWords[quantity.convergence] : <Missing reason="Fewer than three grids" />}</Cell>
                <Cell num><Shown value={quantity.orderObserved} why="No order observed">{(order) => formatOrder(order)}</Shown></Cell>
                <Cell num><Shown value={quantity.orderUsed} why="No order used">{(order) => formatOrder(order)}</Shown></Cell>
                <Cell num><Shown value={quantity.extrapolated} why="Not extrapolated">{(value) => formatValue(value, estimated.absolute)}</Shown></Cell>
                <Cell num><Shown value={quantity.relativeChange} why="No change to tell">{formatPercent}</Shown></Cell>
                <Cell num><Shown value={estimated.fraction} why={`No ${band}`}>{formatPercent}</Shown></Cell>
                <Cell num><Shown value={estimated.absolute} why={`No ${band}`}>{(value) => formatMeasure(value, quantity.unit)}</Shown></Cell>
                <Cell num><Shown value={quantity.target} why="No target">{formatPercent}</Shown></Cell>
              </Row>
              <ReasonRow columns={columns}>
                {explainQuantity(quantity).map(({ sentence, nextStep }) => (
                  <span key={sentence}><FormulaText text={sentence} /> {quantity.outcome !== 'meets-target' && <FormulaText text={nextStep} />} </span>
                ))}
                <FormulaText text={explainProcedure(quantity)} symbols={['p', 'h']} />{' '}
                {withFormal !== null && `With the formal order ${quantity.formalOrder ?? ''} the GCI would be ${formatPercent(withFormal)}.`}
              </ReasonRow>
            </Fragment>
          );
        })}
      </tbody>
    </Table>
  );
}

/** The order of every three consecutive grids. */
export function TripleTable({ quantities, number }: Omit<QuantityTableProps, 'kind'>) {
  const rows = quantities.flatMap(({ name, triples }) => triples.map((triple, index) => ({ name, triple, isFirst: index === 0 })));
  if (rows.length === 0) return null;
  return (
    <Table number={number} caption="The order of every three grids, the finest three first.">
      <Head><tr><HeadCell>Quantity</HeadCell><HeadCell>Grids</HeadCell><HeadCell num>Order</HeadCell><HeadCell afterNumber>Convergence</HeadCell></tr></Head>
      <tbody>
        {rows.map(({ name, triple, isFirst }, index) => (
          <Row key={`${name} ${triple.grids.join(' ')}`} startsGroup={isFirst && index > 0}>
            {isFirst ? <RowHead>{name}</RowHead> : <Cell><span className="sr-only">{name}</span></Cell>}
            <Cell>{triple.grids.join(', ')}</Cell>
            <Cell num><Shown value={triple.order} why="No order">{(order) => formatOrder(order)}</Shown></Cell>
            <Cell afterNumber>{convergenceWords[triple.convergence]}</Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
