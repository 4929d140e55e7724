import type { ReactNode } from 'react';
import { formatOrder } from '@/lib/domain/numbers/format-order';
import type { FigureField } from '@/lib/figures/error-figure/figure-fields';
import { pairPoints } from '@/lib/figures/error-figure/pair-points';
import { spacingLabel } from '@/lib/figures/spacing-label';
import type { FieldAssessment } from '@/lib/numerics/assessment';
import { Cell, HeadCell, Missing, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { NormSymbol, Sym } from '../ui/symbols';
import type { ReadGrid } from './error-read-out';
import { ErrorText } from './error-text';

interface ErrorNumbersProps { number: number; fields: readonly FigureField[]; grids: readonly ReadGrid[] }

function Heads({ fields, what, children }: { fields: readonly FigureField[]; what: string; children: ReactNode }) {
  return (
    <Head>
      <tr>{children}{fields.map(({ field, norms }) => <HeadCell key={field} ofGroup colSpan={norms.length}>{what} <Sym>{field}</Sym></HeadCell>)}</tr>
      <tr>{fields.flatMap(({ field, norms }) => norms.map(({ norm }) => <HeadCell key={`${field} ${norm}`} num><NormSymbol norm={norm} /></HeadCell>))}</tr>
    </Head>
  );
}

function ErrorCell({ series, label }: { series: FieldAssessment; label: string }) {
  const grid = series.grids.find((each) => each.label === label);
  if (!grid) return <Cell num><Missing reason="No error on this grid" /></Cell>;
  return <Cell num className={grid.used ? '' : 'text-graphite'}><span title={grid.used ? undefined : 'Left out of the assessment'}><ErrorText value={grid.error} /></span></Cell>;
}

function OrderCell({ series, coarse, fine }: { series: FieldAssessment; coarse: string; fine: string }) {
  const point = pairPoints(series).find((each) => each.coarse === coarse && each.fine === fine);
  if (!point) return <Cell num><Missing reason="No order for this pair" /></Cell>;
  const formal = series.derivedOrder ?? series.formalOrder;
  const limits = formal === null || series.tolerance === null ? [] : [formal - series.tolerance, formal + 2 * series.tolerance];
  const [low = -Infinity, high = Infinity] = limits;
  return <Cell num className={point.order < low || point.order > high ? 'text-graphite' : ''}>{formatOrder(point.order, limits)}</Cell>;
}

/** The same numbers as the figure, coarse to fine. */
export function ErrorNumbers({ number, fields, grids }: ErrorNumbersProps) {
  const series = fields.flatMap(({ norms }) => norms);
  const pairs = series.flatMap((each) => pairPoints(each)).sort((a, b) => b.h - a.h)
    .filter(({ coarse, fine }, place, all) => all.findIndex((each) => each.coarse === coarse && each.fine === fine) === place);
  return (
    <div className="mt-4 flex flex-col gap-6">
      <Table caption={`The errors of Figure ${number}.`}>
        <Heads fields={fields} what="Error of"><HeadCell rowSpan={2}>Grid</HeadCell><HeadCell rowSpan={2} num><Sym>h</Sym></HeadCell></Heads>
        <tbody>
          {[...grids].reverse().map(({ label, h }) => (
            <Row key={label}>
              <RowHead>{label}</RowHead>
              <Cell num>{spacingLabel(h)}</Cell>
              {fields.flatMap(({ field, norms }) => norms.map((each) => <ErrorCell key={`${field} ${each.norm}`} series={each} label={label} />))}
            </Row>
          ))}
        </tbody>
      </Table>
      {pairs.length > 0 && (
        <Table caption={`The observed orders of Figure ${number}.`}>
          <Heads fields={fields} what="Order of"><HeadCell rowSpan={2}>Grids</HeadCell></Heads>
          <tbody>
            {pairs.map(({ coarse, fine }) => (
              <Row key={`${coarse} ${fine}`}>
                <RowHead>{coarse}, {fine}</RowHead>
                {fields.flatMap(({ field, norms }) => norms.map((each) => <OrderCell key={`${field} ${each.norm}`} series={each} coarse={coarse} fine={fine} />))}
              </Row>
            ))}
          </tbody>
        </Table>
      )}
    </div>
  );
}
