import type { FieldProblem } from '@/lib/errors';
import type { SeriesAssessment } from '@/lib/numerics/assessment';
import { assessSeries } from '@/lib/numerics/assess-series';
import { checkQuickCheck } from './check-quick-check';
import { quickCheckErrors, quickCheckKnown, quickCheckQuantity } from './quick-check-series';
import { quickCheckGrids } from './quick-check-grids';
import type { QuickCheckInput } from './quick-schema';

export type QuickCheckResult = { ok: true; assessment: SeriesAssessment } | { ok: false; faults: FieldProblem[] };

/**
 * Assesses a small table: one quantity (every grid has a value) or one field (every grid has errors). The browser and
 * POST /assess answer by this one. `name` is what the quantity or field is called in the answer.
 */
export function assessQuickCheck(input: QuickCheckInput, name?: string): QuickCheckResult {
  const faults = checkQuickCheck(input);
  if (faults.length > 0) return { ok: false, faults };
  const placed = quickCheckGrids(input);
  if (!placed.ok) return placed;
  const { grids } = placed;
  if (grids.every((grid) => grid.value === undefined)) {
    return { ok: true, assessment: assessSeries({ errors: quickCheckErrors(input, grids, name ?? 'u'), quantities: [] }) };
  }
  const quantityName = name ?? 'value';
  if (input.knownValue !== undefined) {
    const known = quickCheckKnown(input, grids, quantityName, input.knownValue);
    return { ok: true, assessment: assessSeries({ errors: [known], quantities: [] }) };
  }
  return { ok: true, assessment: assessSeries({ errors: [], quantities: [quickCheckQuantity(input, grids, quantityName)] }) };
}
