import type { FieldAssessment, QuantityAssessment, SeriesAssessment } from '@/lib/numerics/assessment';
import { wholeFields } from './whole-fields';

/** What a statement is made from: the shape both of a kept assessment and of one just computed. */
export type StatedAssessment = Pick<SeriesAssessment, 'outcome' | 'reasons' | 'fields' | 'quantities' | 'spaceTime'>;

/** The parts that made the outcome of a study: counting fields, or its quantities where no field counts, or what there is. */
export function decidingParts({ fields: all, quantities, reasons }: StatedAssessment): { fields: FieldAssessment[]; quantities: QuantityAssessment[] } {
  const fields = wholeFields(all);
  const judged = <Part extends { outcome: unknown }>(parts: readonly Part[]) => parts.filter((part) => part.outcome !== null);
  const counting = judged(fields).filter((field) => field.counts);
  if (reasons.includes('nothing-counts') || (counting.length === 0 && judged(quantities).length === 0)) return { fields, quantities };
  return counting.length > 0 ? { fields: counting, quantities: [] } : { fields: [], quantities: judged(quantities) };
}
