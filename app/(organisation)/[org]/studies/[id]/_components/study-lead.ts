import type { Assessment } from '@/lib/domain/assessment/schema';
import { explainStudy } from '@/lib/domain/assessment/explain-study';
import { explainField, explainQuantity } from '@/lib/domain/assessment/reason-text';
import type { FieldAssessment } from '@/lib/numerics/assessment';

interface StudyLead {
  /** How many norms and quantities are as they are, and why. */
  sentences: string[];
  nextStep: string | null;
  /** Norms that do not count, are not as they should be, and say something else than the study as a whole. */
  beside: { field: FieldAssessment; sentence: string }[];
  /** How many more of them Table 1 tells of. */
  more: number;
}

const shownBeside = 2;
const isGood = (outcome: Assessment['outcome']) => outcome === 'pass' || outcome === 'meets-target';

/** What stands under the statement: the rest of the outcome, the way on, and what does not count. Nothing said twice. */
export function leadOf(assessment: Assessment, statement: string): StudyLead {
  const { outcome, fields, quantities } = assessment;
  const [whole] = explainStudy(assessment);
  const concerned = [
    ...fields.filter((field) => field.counts && field.outcome === outcome).map(explainField),
    ...quantities.filter((quantity) => quantity.outcome === outcome).map(explainQuantity),
  ];
  const reason = isGood(outcome) || outcome === null ? undefined : concerned[0]?.[0]?.sentence;
  const sentences = [whole?.sentence, reason].filter((text) => text !== undefined && text !== '' && text !== statement) as string[];
  const beside = fields.filter((field) => !field.counts && field.outcome !== null && field.outcome !== outcome && !isGood(field.outcome))
    .map((field) => ({ field, sentence: explainField(field)[0]?.sentence ?? '' }));
  return {
    sentences: [...new Set(sentences)],
    nextStep: isGood(outcome) ? null : whole?.nextStep || null,
    beside: beside.slice(0, shownBeside), more: Math.max(0, beside.length - shownBeside),
  };
}
