import type { Outcome, ReasonCode } from '@/lib/numerics/assessment';
import type { MarkName } from './outcome-marks';

/** The mark of an outcome: exactness and cases without a known solution have their own. */
export function markOfOutcome(outcome: Outcome, about: { reasons: readonly ReasonCode[]; isSolution: boolean }): MarkName {
  if (outcome === 'pass' && about.reasons.includes('exact')) return 'exact';
  if (outcome === 'inconclusive' && about.isSolution) return 'inconclusive-solution';
  return outcome;
}
