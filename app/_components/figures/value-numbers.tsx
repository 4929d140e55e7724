import { formatMeasure } from '@/lib/domain/numbers/format-measure';
import { formatValue } from '@/lib/domain/numbers/format-value';
import { spacingLabel } from '@/lib/figures/spacing-label';
import { uncertaintyBars } from '@/lib/figures/value-figure/uncertainty-bars';
import type { QuantityAssessment } from '@/lib/numerics/assessment';
import { Cell, HeadCell, Missing, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { FormulaText } from '../ui/formula-text';
import { Sym } from '../ui/symbols';

/** The same numbers as the figure, coarse to fine, the extrapolated value last. */
export function ValueNumbers({ number, quantity }: { number: number; quantity: QuantityAssessment }) {
  const bars = uncertaintyBars(quantity);
  const rows = [...quantity.values].sort((a, b) => b.h - a.h);
  return (
    <div className="mt-4">
      <Table caption={`The values of Figure ${number}.`}>
        <Head>
          <tr>
            <HeadCell>Grid</HeadCell>
            <HeadCell num><Sym>h</Sym></HeadCell>
            <HeadCell num>{quantity.unit ? `Value, ${quantity.unit}` : 'Value'}</HeadCell>
            <HeadCell num>Bar, plus and minus</HeadCell>
          </tr>
        </Head>
        <tbody>
          {rows.map(({ label, h, value }) => {
            const half = bars.find((bar) => bar.h === h)?.half ?? null;
            return (
              <Row key={label}>
                <RowHead>{label}</RowHead>
                <Cell num>{spacingLabel(h)}</Cell>
                <Cell num><FormulaText text={formatValue(value)} /></Cell>
                <Cell num>{half === null ? <Missing reason="No uncertainty on this grid" /> : <FormulaText text={formatMeasure(half)} />}</Cell>
              </Row>
            );
          })}
          {quantity.extrapolated !== null && (
            <Row startsGroup>
              <RowHead>extrapolated</RowHead>
              <Cell num>0</Cell>
              <Cell num><FormulaText text={formatValue(quantity.extrapolated)} /></Cell>
              <Cell num><Missing reason="Extrapolated, without an uncertainty of its own" /></Cell>
            </Row>
          )}
        </tbody>
      </Table>
    </div>
  );
}
