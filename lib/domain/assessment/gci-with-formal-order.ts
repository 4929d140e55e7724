import type { QuantityAssessment } from '@/lib/numerics/assessment';

/**
 * The GCI that the formal order would give, where the observed one is higher and so shrinks the band: a figure to stand
 * beside the other. Null where the observed order is not the higher one or there is no GCI.
 */
export function gciWithFormalOrder({ gci, orderUsed, formalOrder, branch, triples, values }: QuantityAssessment): number | null {
  if (gci === null || orderUsed === null || formalOrder === null || branch !== 'observed' || orderUsed <= formalOrder) return null;
  const [fine, middle] = (triples[0]?.grids ?? []).map((label) => values.find((value) => value.label === label)?.h);
  if (fine === undefined || middle === undefined) return null;
  const growth = (order: number) => Math.expm1(order * Math.log(middle / fine));
  return (gci * growth(orderUsed)) / growth(formalOrder);
}
