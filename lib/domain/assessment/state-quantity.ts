import type { QuantityAssessment } from '@/lib/numerics/assessment';
import { formatMeasure } from '../numbers/format-measure';
import { formatOrder } from '../numbers/format-order';
import { formatValue } from '../numbers/format-value';
import { estimatedBand, printBand } from './estimated-band';

/**
 * How a quantity converges, in words: order, extrapolated value and uncertainty of the finest grid. Half the range where there is
 * no order. Null where too little is known for a sentence of its own.
 */
export function stateQuantity(quantity: QuantityAssessment): string | null {
  const { convergence, orderUsed, orderObserved, extrapolated, halfRange, unit, branch } = quantity;
  const values = `The values of ${quantity.name}`;
  const { absolute, longName } = estimatedBand(quantity);
  if (extrapolated !== null && absolute !== null) {
    const towards = `${formatValue(extrapolated, absolute, 1)}${unit ? ` ${unit}` : ''}`;
    const how = branch === 'formal-two-grids'
      ? `Two grids show no order; with the formal order ${orderUsed ?? '–'} ${values.replace('The', 'the')} head for ${towards}.`
      : convergence === 'monotone' ? `${values} converge monotonically${orderObserved === null ? '' : ` with order ${formatOrder(orderObserved)}`} towards ${towards}.`
        : `${values} do not converge monotonically; a fit over all grids heads for ${towards}.`;
    return `${how} On the finest grid the ${longName} is ${printBand(quantity)}.`;
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
