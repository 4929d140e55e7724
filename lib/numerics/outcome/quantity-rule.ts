import type { Outcome, QuantitySeries, ReasonCode } from '../assessment';
import { spansRatio } from '../spacing/spans-ratio';
import type { PrintedGrid, QuantityTriple } from './quantity-triples';

interface Observed { grids: readonly PrintedGrid[]; triples: readonly QuantityTriple[]; areApart: boolean; band: number | null }
interface Verdict { outcome: Outcome | null; reasons: ReasonCode[] }

/** A value smaller than ten of its last changes makes every fraction of it meaningless. */
const changesPerValue = 10;

/**
 * Outcome of a quantity without an exact solution: meets its target where the values converge monotonically, the orders
 * of the last two triples (with three grids: of the one) lie within max(0.1, 0.05·pf) of pf, and the GCI or U is at or
 * under the target; misses it where the same holds but for the last; otherwise inconclusive. Null with `no-target` without a
 * formal order or a target.
 *
 * On grids that are not refined alike no target is met: inconclusive. A value near zero (|φ1| < 10|ε21|) has no meaningful GCI in percent and is not held against one: inconclusive.
 */
export function quantityRule(series: QuantitySeries, { grids, triples, areApart, band }: Observed): Verdict {
  const { formalOrder, target } = series;
  if (formalOrder === null || target === null) return { outcome: null, reasons: ['no-target'] };
  if (series.grids.length < 2) return inconclusive('too-few-grids');
  const lastTwo = triples.slice(0, 2);
  if (lastTwo.length === 0) return inconclusive('order-not-observed');
  if (grids.length < series.minimumGrids || !areApart || !spansRatio(grids.map((grid) => grid.h))) return inconclusive('too-few-grids');
  if (lastTwo.some((triple) => triple.isOutOfRange)) return inconclusive('order-out-of-range');
  if (lastTwo.some((triple) => triple.convergence !== 'monotone')) return inconclusive('not-monotone');
  const tolerance = Math.max(0.1, 0.05 * formalOrder);
  if (lastTwo.some(({ order }) => order === null || Math.abs(order - formalOrder) > tolerance)) return inconclusive('order-off-formal');
  const [last] = lastTwo;
  if (!last || band === null || Math.abs(last.grids[0].value) < changesPerValue * Math.abs(last.differences.e21)) return inconclusive('no-target');
  if (band <= target && series.dissimilar) return inconclusive('not-similar');
  return band <= target ? { outcome: 'meets-target', reasons: ['within-target'] } : { outcome: 'misses-target', reasons: ['above-target'] };
}

function inconclusive(reason: ReasonCode): Verdict {
  return { outcome: 'inconclusive', reasons: [reason] };
}
