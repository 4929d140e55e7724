import type { FieldAssessment, Outcome, QuantityAssessment } from '@/lib/numerics/assessment';
import { decidingParts, type StatedAssessment } from './deciding-parts';
import { estimatedBand } from './estimated-band';
import { explainStudy } from './explain-study';
import { explainField, explainQuantity } from './reason-text';
import { stateQuantity } from './state-quantity';
import { stateSpaceTime } from './state-space-time';
import { stateRatio, type Refinement } from './state-ratio';

/** Reasons under which the ratio of the last errors says nothing, or not the thing that matters. */
const besideRatio = new Set<string>(['exact', 'exact-not-declared', 'not-exact', 'too-few-grids', 'scatter', 'errors-rise', 'sampling-not-stated']);

/**
 * The study in one sentence with its numbers: what refining did to the counting norm farthest from its formal order,
 * among those that made the outcome, or how the quantity nearest to missing its target converges. The outcome's word
 * stands apart, so that a page can set its mark beside it.
 */
export function stateOutcome(assessment: StatedAssessment, refinement: Refinement = 'space'): { outcome: Outcome | null; sentence: string } {
  const { outcome, spaceTime } = assessment;
  if (spaceTime) return { outcome, sentence: stateSpaceTime(spaceTime) };
  const { fields, quantities } = decidingParts(assessment);
  const nothingCounts = assessment.reasons.includes('nothing-counts');
  const field = nothingCounts ? undefined : farthestField(fields.filter((part) => part.outcome === outcome));
  if (field) return { outcome, sentence: stateField(field, refinement) };
  const quantity = nothingCounts ? undefined : worstQuantity(quantities.filter((part) => part.outcome === outcome));
  if (quantity) return { outcome, sentence: stateQuantity(quantity) ?? explainQuantity(quantity)[0]?.sentence ?? '' };
  return { outcome, sentence: explainStudy(assessment)[0]?.sentence ?? '' };
}

function stateField(field: FieldAssessment, refinement: Refinement): string {
  const ratio = field.reasons.some((reason) => besideRatio.has(reason)) ? null : stateRatio(field, refinement);
  return ratio ?? explainField(field)[0]?.sentence ?? '';
}

function farthestField(fields: readonly FieldAssessment[]): FieldAssessment | undefined {
  const gap = ({ orders, formalOrder, derivedOrder }: FieldAssessment) => {
    const [order, declared] = [orders[0]?.order, derivedOrder ?? formalOrder];
    return order === null || order === undefined || declared === null ? -1 : Math.abs(order - declared);
  };
  return fields.reduce<FieldAssessment | undefined>((farthest, field) => (farthest && gap(farthest) >= gap(field) ? farthest : field), undefined);
}

function worstQuantity(quantities: readonly QuantityAssessment[]): QuantityAssessment | undefined {
  const share = (quantity: QuantityAssessment) => {
    const { fraction } = estimatedBand(quantity);
    return fraction === null ? Infinity : fraction / (quantity.target ?? 1);
  };
  return quantities.reduce<QuantityAssessment | undefined>((worst, quantity) => (worst && share(worst) >= share(quantity) ? worst : quantity), undefined);
}
