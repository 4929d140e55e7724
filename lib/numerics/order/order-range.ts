import { gridTriple } from './grid-triple';
import { threeGridOrder } from './three-grid-order';

/** A value and by how much printing may have moved it. */
interface PrintedValue { h: number; value: number; halfUnit: number }

/**
 * The interval of the three-grid order that the printed digits leave open: the lowest and highest order over the eight
 * corners φi ± half a unit. The order is monotone in each value, so the extremes lie at corners.
 *
 * Returns null where a corner has no order: the digits then do not tell it.
 */
export function orderRange(fine: PrintedValue, middle: PrintedValue, coarse: PrintedValue): [number, number] | null {
  let low = Infinity;
  let high = -Infinity;
  for (let corner = 0; corner < 8; corner += 1) {
    const shifted = [fine, middle, coarse].map(({ h, value, halfUnit }, i) => ({
      h, value: value + (((corner >> i) & 1) === 1 ? halfUnit : -halfUnit),
    }));
    const [first, second, third] = shifted;
    if (!first || !second || !third) return null;
    const { order } = threeGridOrder(gridTriple(first, second, third));
    if (order === null) return null;
    low = Math.min(low, order);
    high = Math.max(high, order);
  }
  return [low, high];
}
