import { estimatedBand } from '@/lib/domain/assessment/estimated-band';
import type { QuantityAssessment, SeriesAssessment } from '@/lib/numerics/assessment';
import { columnsOf, isBlankRow, type QuickState } from './quick-state';

const line = (cells: readonly (string | number | null)[]) => cells.map((cell) => cell ?? '').join('\t');

function bandLines(quantity: QuantityAssessment): string[] {
  const { name, fraction, absolute } = estimatedBand(quantity);
  return [line(['procedure', quantity.procedure]), line([name, fraction]), line([`${name} in the unit`, absolute])];
}

/** The table as typed and what came of it, in full precision, for a spreadsheet. */
export function quickTsv(state: QuickState, labels: readonly string[], assessment: SeriesAssessment): string {
  const typed = state.rows.flatMap((row, index) => (isBlankRow(row) ? [] : [line([labels[index] ?? '', ...row.map((cell) => cell.trim())])]));
  const quantities = assessment.quantities.flatMap((quantity) => [
    line(['order observed', quantity.orderObserved]), line(['order used', quantity.orderUsed]), line(['extrapolated', quantity.extrapolated]),
    line(['relative change', quantity.relativeChange]), ...bandLines(quantity),
  ]);
  const pairs = assessment.fields.flatMap(({ norm, outcome, orders }) => [
    line([norm, 'outcome', outcome]), ...orders.toReversed().map(({ coarse, fine, order }) => line([norm, `order of grids ${coarse}, ${fine}`, order])),
  ]);
  return [line(['grid', ...columnsOf(state)]), ...typed, '', ...quantities, ...pairs].join('\n');
}
