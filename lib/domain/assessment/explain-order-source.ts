import type { FieldAssessment } from '@/lib/numerics/assessment';
import { formatOrder } from '../numbers/format-order';

/** What stands between the stated order and the one judged by, or between the error and the one its orders are read from. */
export function explainOrderSource({ formalOrder, statedOrder, regularity, logFactor, derivedOrder, comparedTo }: FieldAssessment): string[] {
  return [
    ...(comparedTo === undefined ? [] : [`There is no exact solution: each error is the norm of what the solution differs by from that of the next coarser grid, up to ${comparedTo.label}, and an order takes three grids.`]),
    ...(statedOrder !== undefined && formalOrder !== null && derivedOrder === null
      ? [`A regularity of ${regularity ?? '–'} leaves order ${formatOrder(formalOrder)} of the stated ${statedOrder}.`] : []),
    ...(logFactor === undefined ? [] : [`The orders are those of the error divided by |ln(h/L)|${logFactor === 1 ? '' : ` to the power ${logFactor}`}, with L the length of the domain.`]),
  ];
}
