import type { SeriesNorm } from '../assessment';

/**
 * The order that a solution of regularity λ (u ~ r^λ near its worst point) leaves of a formal one: min(pf, 2λ) in L1, L2
 * and for values such as energies and eigenvalues, min(pf, λ) in H1 and the energy norm and, since the largest error lies
 * at that point, in L∞. G. Strang and G. J. Fix, An Analysis of the Finite Element Method (1973), ch. 8.
 * Throws for a regularity of 0 or less.
 */
export function regularOrder(norm: SeriesNorm, formalOrder: number, regularity: number): number {
  if (!(regularity > 0)) throw new RangeError(`regularity must be above 0, got ${regularity}`);
  const isOnce = norm === 'H1' || norm === 'energy' || norm === 'Linf';
  return Math.min(formalOrder, isOnce ? regularity : 2 * regularity);
}
