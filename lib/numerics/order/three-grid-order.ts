import type { GridTriple } from './grid-triple';

/** Orders outside are no order of any scheme; the exponentials stay finite within. */
const lowest = -10;
const highest = 20;
const halvings = 60;

type ThreeGridOrder = { order: number } | { order: null; reason: 'not-monotone' | 'order-out-of-range' };

/**
 * Order p seen on three grids of any ratios without an exact solution: the root of
 * g(p) = ln[(r21^p − 1)/(r32^p − 1)] − p·ln r21 − ln(ε21/ε32), the equation of I. B. Celik et al., J. Fluids Eng. 130
 * (2008) 078001 without its outer absolute value, which would turn divergence into a positive order.
 *
 * g falls strictly, so there is at most one root; at p = 0 it has the limit ln(ln r21/ln r32) − ln(ε21/ε32). A negative
 * p means that the values diverge. Returns null with a reason where the differences have opposite signs or one is zero
 * (no root), and where the root lies outside [−10, 20].
 */
export function threeGridOrder({ e21, e32, r21, r32 }: GridTriple): ThreeGridOrder {
  const ratio = e21 / e32;
  if (!(ratio > 0 && Number.isFinite(ratio))) return { order: null, reason: 'not-monotone' };
  const logRatio = Math.log(ratio);
  const [log21, log32] = [Math.log(r21), Math.log(r32)];
  const g = (p: number) => {
    if (p === 0) return Math.log(log21 / log32) - logRatio;
    return Math.log(-Math.expm1(-p * log21) / Math.expm1(p * log32)) - logRatio;
  };
  if (g(lowest) < 0 || g(highest) > 0) return { order: null, reason: 'order-out-of-range' };
  let low = lowest;
  let high = highest;
  for (let i = 0; i < halvings; i += 1) {
    const middle = (low + high) / 2;
    if (g(middle) > 0) low = middle;
    else high = middle;
  }
  return { order: (low + high) / 2 };
}
