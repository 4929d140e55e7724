import type { Assessment } from '../assessment/schema';
import { judgedFields, judgedOrder, lastOrder } from './judged-fields';
import type { MatrixCell } from './schema';

/**
 * Of the counting fields and norms, the one whose last observed order is lowest against its formal order; of a study
 * judged by quantities alone, the quantity.
 */
export function lowestOrder(assessment: Assessment): MatrixCell['lowest'] {
  const fields = judgedFields(assessment).map((field) => ({
    field: field.field, norm: field.norm, observed: lastOrder(field), formalOrder: judgedOrder(field),
  }));
  const quantities = assessment.quantities.map((quantity) => ({
    field: quantity.name, norm: 'value', observed: quantity.orderObserved, formalOrder: quantity.formalOrder,
  }));
  let lowest: MatrixCell['lowest'] = null;
  for (const { observed, formalOrder, ...of } of fields.length > 0 ? fields : quantities) {
    if (observed === null || formalOrder === null) continue;
    if (lowest === null || observed / formalOrder < lowest.observed / lowest.formalOrder) lowest = { ...of, observed, formalOrder };
  }
  return lowest;
}
