import type { Convergence } from '../assessment';
import type { GridTriple } from '../order/grid-triple';

/** Half units of the values at the finest, middle and coarsest grid. */
type HalfUnits = readonly [number, number, number];

/** What subtracting two rounded values may add, as a part of the half units compared with. */
const roundingSlack = 1e-6;

/**
 * How three values behave under refinement, from R = ε21/ε32: 0 < R < ln r21/ln r32 monotone convergence, R at or above
 * that bound divergence, R < 0 oscillatory (|R| < 1 converging, else diverging). With unequal ratios the familiar
 * bound 1 is wrong. A difference no larger than the half units of its two values added is no change at all.
 */
export function convergenceType({ e21, e32, r21, r32 }: GridTriple, [fine, middle, coarse]: HalfUnits = [0, 0, 0]): Convergence {
  const unseen = (difference: number, halfUnits: number) => Math.abs(difference) <= halfUnits * (1 + roundingSlack);
  if (unseen(e21, fine + middle) || unseen(e32, middle + coarse)) return 'unchanged';
  const ratio = e21 / e32;
  if (ratio < 0) return Math.abs(ratio) < 1 ? 'oscillatory' : 'oscillatory-divergent';
  return ratio < Math.log(r21) / Math.log(r32) ? 'monotone' : 'divergent';
}
