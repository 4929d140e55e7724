import type { FieldAssessment, QuantityAssessment } from '@/lib/numerics/assessment';
import type { Explanation } from './explanation';
import { gatherFieldFacts } from './field-facts';
import { fieldReasons } from './field-reasons';
import { quantityReasons } from './quantity-reasons';

/** A sentence and a next step for every reason of a field and norm. Throws for a reason that fields do not have. */
export function explainField(field: FieldAssessment): Explanation[] {
  const facts = gatherFieldFacts(field);
  return field.reasons.map((code) => {
    const text = fieldReasons[code];
    if (!text) throw new RangeError(`reason of a field must be one that fields have, got ${code}`);
    return text(facts, field);
  });
}

/** A sentence and a next step for every reason of a quantity. Throws for a reason that quantities do not have. */
export function explainQuantity(quantity: QuantityAssessment): Explanation[] {
  return quantity.reasons.map((code) => {
    const text = quantityReasons[code];
    if (!text) throw new RangeError(`reason of a quantity must be one that quantities have, got ${code}`);
    return text(quantity);
  });
}
