/** The gap of first-order error hidden under a second-order term doubles at each halving; 1.3 tells it from noise. */
const growth = 1.3;

/**
 * Whether the orders leave the formal one, to either side, while still inside the band: |gap_b| > 1.3|gap_a| + 2u_b, and
 * with three pairs or more (|gap_a| > 1.3 of the one before and |gap_b| ≥ 0.01, or |gap_b| ≥ tol/2); with two pairs
 * |gap_b| ≥ tol/4. `gaps`: pf − p, coarse to fine.
 */
export function isDeparting(gaps: readonly number[], lastUncertainty: number, tolerance: number): boolean {
  const [b = 0, a = 0, before] = gaps.map(Math.abs).reverse();
  if (!(b > growth * a + 2 * lastUncertainty)) return false;
  if (before === undefined) return b >= tolerance / 4;
  return (a > growth * before && b >= 0.01) || b >= tolerance / 2;
}
