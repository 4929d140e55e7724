import { threeGridOrder } from './three-grid-order';

interface Difference {
  /** Spacing of the finer grid of its two. */
  h: number;
  /** Norm of the difference, above 0 for an order. */
  error: number;
  /** Known error of that norm, in its unit. */
  knownError: number;
}

/**
 * Order seen in the norms of differences of three consecutive solutions on the same points, with grids of any ratio
 * (threeGridOrder over the norms, which have no sign), and how far the known errors could move it: the relative ones added,
 * over the slope of ln(ε21/ε32) in p, which is −ln r for one ratio.
 *
 * `fine` is the difference of grids 1 and 2, `coarse` that of grids 2 and 3, `coarsest` the spacing of grid 3. Never
 * against a finer reference, which inflates the order. Nulls where a norm is 0 or the order lies outside [−10, 20].
 * Throws where the spacings do not rise.
 */
export function differenceOrder(fine: Difference, coarse: Difference, coarsest: number): { order: number | null; uncertainty: number | null } {
  const [r21, r32] = [coarse.h / fine.h, coarsest / coarse.h];
  if (!(r21 > 1 && r32 > 1)) throw new RangeError(`spacings must rise from fine to coarse, got ${fine.h}, ${coarse.h}, ${coarsest}`);
  if (fine.error === 0 || coarse.error === 0) return { order: null, uncertainty: null };
  const { order } = threeGridOrder({ e21: fine.error, e32: coarse.error, r21, r32 });
  if (order === null) return { order, uncertainty: null };
  const known = fine.knownError / fine.error + coarse.knownError / coarse.error;
  return { order, uncertainty: Math.min(known / slope(order, Math.log(r21), Math.log(r32)), Number.MAX_VALUE) };
}

/** −d ln(ε21/ε32)/dp, where ε21/ε32 = (r21^p − 1)/(r21^p·(r32^p − 1)). */
function slope(p: number, log21: number, log32: number): number {
  return log21 + logSlope(p, log32) - logSlope(p, log21);
}

/** d ln|r^p − 1|/dp = ln r/(1 − r^−p), without the 1/p that both parts share at p = 0. */
function logSlope(p: number, logRatio: number): number {
  const x = p * logRatio;
  return Math.abs(x) < 1e-6 ? logRatio * (0.5 + x / 12) : logRatio / -Math.expm1(-x) - logRatio / x;
}
