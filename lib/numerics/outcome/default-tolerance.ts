import type { SeriesNorm } from '../assessment';

/**
 * How far below the formal order an observed one may lie: max(0.1, 0.05·pf), for L∞ max(0.2, 0.1·pf), since a maximum
 * over few cells settles later. Above it twice as much is allowed.
 */
export function defaultTolerance(norm: SeriesNorm, formalOrder: number): number {
  return norm === 'Linf' ? Math.max(0.2, 0.1 * formalOrder) : Math.max(0.1, 0.05 * formalOrder);
}
