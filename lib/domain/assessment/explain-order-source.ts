import type { FieldAssessment } from '@/lib/numerics/assessment';
import { formatOrder } from '../numbers/format-order';

/** What stands between the stated order and the one judged by, or between the error and the one its orders are read from. */
export function explainOrderSource({ formalOrder, statedOrder, regularity, logFactor, derivedOrder, comparedTo, elements }: FieldAssessment): string[] {
  return [
    ...(comparedTo === undefined ? [] : [`There is no exact solution: each error is the norm of what the solution differs by from that of the next coarser grid, up to ${comparedTo.label}, and an order takes three grids.`]),
    ...explainElements(statedOrder ?? formalOrder, elements),
    ...(statedOrder !== undefined && formalOrder !== null && derivedOrder === null
      ? [`A regularity of ${regularity ?? '–'} leaves order ${formatOrder(formalOrder)} of the stated ${statedOrder}.`] : []),
    ...(logFactor === undefined ? [] : [`The orders are those of the error divided by |ln(h/L)|${logFactor === 1 ? '' : ` to the power ${logFactor}`}, with L the length of the domain.`]),
  ];
}

/** Which order the elements promise, and that the case states another. */
function explainElements(stated: number | null, elements: FieldAssessment['elements']): string[] {
  if (!elements || stated === null) return [];
  const { degree, order } = elements;
  return [stated === order ? `Order ${order} is that of elements of degree ${degree} in this norm.` : `Elements of degree ${degree} promise order ${order} in this norm; the case states ${Number(stated.toPrecision(4))}.`];
}
