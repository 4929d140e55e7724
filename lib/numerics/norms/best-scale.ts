/** A likeness this small is rounding. */
const unlike = 1e-12;

/** Root mean squares of q − q_exact, q_exact and q, with the same weights. */
interface RootMeans { error: number; exact: number; value: number }

/**
 * The factor s that brings a field known up to a scale (an eigenvector) nearest to the exact one: Σw(sq − q_exact)² is
 * least for s = Σw·q·q_exact/Σwq², where Σw·q·q_exact = (Σwq² + Σwq_exact² − Σw(q − q_exact)²)/2. Of either sign.
 * 1 where q is zero or without likeness to the exact field: there is nothing to scale.
 */
export function bestScale({ error, exact, value }: RootMeans): number {
  const product = (value ** 2 + exact ** 2 - error ** 2) / 2;
  if (!(Math.abs(product) > unlike * value * exact)) return 1;
  return product / value ** 2;
}
