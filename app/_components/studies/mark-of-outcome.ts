import type { MarkName } from '@/lib/figures/outcome-marks';
import type { Outcome, ReasonCode } from '@/lib/numerics/assessment';

interface Surroundings { kind?: 'order' | 'exactness' | 'benchmark' | 'solution'; reasons?: readonly ReasonCode[] }

/** The mark of an outcome: a pass by exactness and an open solution case have marks of their own; no outcome, none. */
export function markOfOutcome(outcome: Outcome | null, { kind, reasons = [] }: Surroundings = {}): MarkName | null {
  if (outcome === 'pass' && reasons.includes('exact')) return 'exact';
  if (outcome === 'inconclusive' && kind === 'solution') return 'inconclusive-solution';
  return outcome;
}
