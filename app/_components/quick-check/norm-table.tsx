import { formatOrder } from '@/lib/domain/numbers/format-order';
import { formatRatio } from '@/lib/domain/numbers/format-ratio';
import { defaultTolerance } from '@/lib/numerics/outcome/default-tolerance';
import type { FieldAssessment } from '@/lib/numerics/assessment';
import { markOfOutcome } from '../studies/mark-of-outcome';
import { Cell, HeadCell, Missing, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { NormSymbol } from '../ui/symbols';
import { OutcomeWord } from '../ui/outcome-word';

function bandOf({ formalOrder, derivedOrder, tolerance, norm }: FieldAssessment): [number, number] | null {
  const order = derivedOrder ?? formalOrder;
  if (order === null) return null;
  const width = tolerance ?? defaultTolerance(norm, order);
  return [order - width, order + 2 * width];
}

function lastRatio({ grids, orders }: FieldAssessment): number | null {
  const errorOf = (label: string | undefined) => grids.find((grid) => grid.label === label)?.error;
  const [coarse, fine] = [errorOf(orders[0]?.coarse), errorOf(orders[0]?.fine)];
  return coarse && fine ? coarse / fine : null;
}

/** The outcome of each norm, and the observed order of each pair of grids, coarse to fine. */
export function NormTable({ fields }: { fields: readonly FieldAssessment[] }) {
  const pairs = [...new Set(fields.flatMap(({ orders }) => orders.map(({ coarse, fine }) => `${coarse}, ${fine}`)))].toReversed();
  return (
    <Table number={1} caption="Outcome, and the observed order of each pair of grids.">
      <Head>
        <tr>
          <HeadCell rowSpan={2}>Norm</HeadCell><HeadCell rowSpan={2}>Outcome</HeadCell><HeadCell rowSpan={2} num>Formal</HeadCell><HeadCell rowSpan={2} num>Band</HeadCell>
          {pairs.length > 0 && <HeadCell ofGroup colSpan={pairs.length}>Order of grids</HeadCell>}<HeadCell rowSpan={2} num>Last ratio</HeadCell>
        </tr>
        <tr>{pairs.map((pair) => <HeadCell key={pair} num>{pair}</HeadCell>)}</tr>
      </Head>
      <tbody>
        {fields.map((field) => {
          const band = bandOf(field);
          const mark = markOfOutcome(field.outcome, { reasons: field.reasons });
          const ratio = lastRatio(field);
          return (
            <Row key={field.norm}>
              <RowHead><NormSymbol norm={field.norm} /></RowHead>
              <Cell>{mark === null ? <Missing reason="Not judged: no formal order" /> : <OutcomeWord mark={mark} lineStart />}</Cell>
              <Cell num>{field.formalOrder ?? <Missing reason="No formal order" />}</Cell>
              <Cell num>{band === null ? <Missing reason="No formal order" /> : `${formatOrder(band[0])} to ${formatOrder(band[1])}`}</Cell>
              {pairs.map((pair) => {
                const order = field.orders.find(({ coarse, fine }) => `${coarse}, ${fine}` === pair)?.order ?? null;
                const isOutside = order !== null && band !== null && (order < band[0] || order > band[1]);
                return <Cell key={pair} num className={isOutside ? 'text-graphite' : ''}>{order === null ? <Missing reason="No order" /> : formatOrder(order, band ?? [])}</Cell>;
              })}
              <Cell num>{ratio === null ? <Missing reason="No pair of grids" /> : `÷ ${formatRatio(ratio)}`}</Cell>
            </Row>
          );
        })}
      </tbody>
    </Table>
  );
}
