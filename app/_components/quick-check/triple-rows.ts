import { assessQuickCheck } from '@/lib/domain/assessment/quick-check';
import type { QuickCheckInput } from '@/lib/domain/assessment/quick-schema';
import type { QuantityAssessment } from '@/lib/numerics/assessment';

/** Each three consecutive grids assessed for themselves, the finest first. */
export function assessTriples(input: QuickCheckInput, quantity: QuantityAssessment): QuantityAssessment[] {
  return quantity.triples.flatMap(({ grids }) => {
    const result = assessQuickCheck({ ...input, grids: input.grids.filter(({ label }) => label !== undefined && grids.includes(label)) }, quantity.name);
    return result.ok ? result.assessment.quantities : [];
  });
}
