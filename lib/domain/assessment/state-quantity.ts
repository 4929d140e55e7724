import type { QuantityAssessment } from '@/lib/numerics/assessment';
import { formatMeasure } from '../numbers/format-measure';
import { formatOrder } from '../numbers/format-order';
import { formatValue } from '../numbers/format-value';
import { printGci } from './print-gci';

/**
 * How a quantity converges, in words: order, extrapolated value and GCI of the finest grid. Half the range where there is
 * no order. Null where too little is known for a sentence of its own.
 */
export function stateQuantity(quantity: QuantityAssessment): string | null {
  const { convergence, orderUsed, extrapolated, gciAbsolute, halfRange, unit, branch } = quantity;
  const values = `The values of ${quantity.name}`;
  if (orderUsed !== null && extrapolated !== null && gciAbsolute !== null) {
    const towards = `${formatValue(extrapolated, gciAbsolute, 1)}${unit ? ` ${unit}` : ''}`;
    const how = branch === 'observed'
      ? `${values} converge monotonically with order ${formatOrder(orderUsed)} towards ${towards}.`
      : `Two grids show no order; with the formal order ${orderUsed} ${values.replace('The', 'the')} head for ${towards}.`;
    return `${how} On the finest grid the grid convergence index is ${printGci(quantity)}.`;
  }
  if (convergence === null || halfRange === null) return null;
  const range = formatMeasure(halfRange, unit);
  switch (convergence) {
    case 'oscillatory': return `${values} oscillate as the grid is refined, with a shrinking step: half their range is ${range}.`;
    case 'oscillatory-divergent': return `${values} oscillate as the grid is refined, with a growing step: half their range is ${range}.`;
    case 'divergent': return `${values} move further apart as the grid is refined: half their range is ${range}.`;
    case 'unchanged': return `${values} differ by no more than their printed digits: half their range is ${range}.`;
    case 'monotone': return `${values} converge monotonically, with no order between −10 and 20: half their range is ${range}.`;
  }
}
