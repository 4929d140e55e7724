import type { SeriesNorm } from '../assessment';

/**
 * The order that finite elements of a degree k promise for a smooth solution: k + 1 in L1, L2 and L∞, k in H1 and the energy
 * norm and for derivatives such as stresses, 2k for energies and eigenvalues (norm "value"). What a regularity leaves of it is
 * regularOrder's. G. Strang and G. J. Fix, An Analysis of the Finite Element Method (1973), ch. 3 and 6.
 * Throws for a degree below 1.
 */
export function elementOrder(norm: SeriesNorm, degree: number, isDerivative = false): number {
  if (!(degree >= 1)) throw new RangeError(`degree must be 1 or above, got ${degree}`);
  if (norm === 'value') return 2 * degree;
  return norm === 'H1' || norm === 'energy' || isDerivative ? degree : degree + 1;
}
