import type { FieldAssessment, Outcome, QuantityAssessment, ReasonCode } from '../assessment';

interface Judged { outcome: Outcome | null; reasons: readonly ReasonCode[] }
interface Verdict { outcome: Outcome | null; reasons: ReasonCode[] }

/**
 * Outcome of a study from its parts: any counting field and norm that fails → fail; all pass → pass; else inconclusive;
 * none counts → inconclusive `nothing-counts`. L1 alone may not count, L2 or L∞ of the same field must (a band of one
 * cell with error h leaves L1 at its order). Parts without an outcome decide nothing; a study of nothing else has none.
 *
 * Quantities decide, in words of their own, where no field counts, and are never evidence that an option is verified.
 * The reasons are those of the parts that made the outcome, each once.
 */
export function studyOutcome(fields: readonly FieldAssessment[], quantities: readonly QuantityAssessment[]): Verdict {
  const judgedFields = fields.filter((field) => field.outcome !== null);
  const judgedQuantities = quantities.filter((quantity) => quantity.outcome !== null);
  const counting = judgedFields.filter((field) => field.counts);
  if (counting.length === 0 && judgedQuantities.length > 0) return decide(judgedQuantities, 'meets-target', 'misses-target');
  if (judgedFields.length === 0 && fields.length + quantities.length > 0) return { outcome: null, reasons: ['no-target'] };
  if (!counting.some((field) => field.norm !== 'L1')) return { outcome: 'inconclusive', reasons: ['nothing-counts'] };
  const verdict = decide(counting, 'pass', 'fail');
  const hasLoneL1 = counting.some((field) => field.norm === 'L1' && !counting.some((other) => other.field === field.field && other.norm !== 'L1'));
  return verdict.outcome === 'pass' && hasLoneL1 ? { outcome: 'inconclusive', reasons: ['nothing-counts'] } : verdict;
}

function decide(parts: readonly Judged[], good: Outcome, bad: Outcome): Verdict {
  const outcome = parts.some((part) => part.outcome === bad) ? bad : parts.every((part) => part.outcome === good) ? good : 'inconclusive';
  return { outcome, reasons: [...new Set(parts.filter((part) => part.outcome === outcome).flatMap((part) => part.reasons))] };
}
