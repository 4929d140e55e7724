import { relativeSize } from './relative-size';

interface GridValue { h: number; value: number }

/**
 * Grid convergence index of the finer of two grids, as a fraction, Fs·|(φ1 − φ2)/φ1|/(r^p − 1), and in the unit of the
 * quantity, Fs·|φ2 − φ1|/(r^p − 1), r = h2/h1. P. J. Roache, J. Fluids Eng. 116 (1994) 405.
 *
 * An uncertainty of about 95 % by experience, not a bound. Not for p ≤ 0: throws. The fraction is null where φ1 is 0.
 */
export function gridConvergenceIndex(
  { fine, coarse }: { fine: GridValue; coarse: GridValue }, order: number, safetyFactor: number,
): { fraction: number | null; absolute: number } {
  if (!(order > 0)) throw new RangeError(`order must be above 0, got ${order}`);
  const growth = Math.expm1(order * Math.log(coarse.h / fine.h));
  const absolute = (safetyFactor * Math.abs(coarse.value - fine.value)) / growth;
  return { fraction: relativeSize(absolute, fine.value), absolute };
}
