import { decidingParts, type StatedAssessment } from './deciding-parts';
import type { Explanation } from './explanation';
import { explainField, explainQuantity } from './reason-text';
import { spaceTimeNextStep, stateSpaceTime } from './state-space-time';
import { joinWords, nameSeries } from './series-name';
import { wholeFields } from './whole-fields';

/**
 * Why the study as a whole has its outcome: how many of what counts pass, fail or stay open, by name, and the next step
 * of the first that is not as it should be.
 */
export function explainStudy(assessment: StatedAssessment): Explanation[] {
  if (assessment.spaceTime) return [{ sentence: stateSpaceTime(assessment.spaceTime), nextStep: spaceTimeNextStep }];
  if (assessment.reasons.includes('nothing-counts')) return [explainNothingCounts(assessment)];
  const { fields, quantities } = decidingParts(assessment);
  if (assessment.outcome === null) {
    const first = fields.map(explainField)[0]?.[0] ?? quantities.map(explainQuantity)[0]?.[0];
    return [{ sentence: 'Nothing here is judged.', nextStep: first?.nextStep ?? 'Declare a formal order to have it judged.' }];
  }
  const parts = [
    ...fields.map((field) => ({ name: nameSeries(field), outcome: field.outcome, explain: () => explainField(field) })),
    ...quantities.map((quantity) => ({ name: quantity.name, outcome: quantity.outcome, explain: () => explainQuantity(quantity) })),
  ];
  const noun = fields.length > 0 ? 'norm' : 'quantity';
  const concerned = parts.filter((part) => part.outcome === assessment.outcome);
  return [{
    sentence: countSentence(concerned.map((part) => part.name), { all: parts.length, noun, outcome: assessment.outcome }),
    nextStep: concerned[0]?.explain()[0]?.nextStep ?? '',
  }];
}

const said = {
  pass: ['passes', 'pass'], fail: ['fails', 'fail'], inconclusive: ['is inconclusive', 'are inconclusive'],
  'meets-target': ['meets its target', 'meet their targets'], 'misses-target': ['misses its target', 'miss their targets'],
} as const;

function countSentence(names: readonly string[], { all, noun, outcome }: { all: number; noun: string; outcome: keyof typeof said }): string {
  const plural = noun === 'quantity' ? 'quantities' : `${noun}s`;
  const [one, several] = said[outcome];
  if (all === 1) return noun === 'norm' ? `The one norm that counts, ${names.join('')}, ${one}.` : `The one quantity, ${names.join('')}, ${one}.`;
  const which = noun === 'norm' ? `${plural} that count` : plural;
  if (names.length === all) return `${all === 2 ? 'Both' : `All ${all}`} ${which} ${several}.`;
  return `${names.length} of ${all} ${which} ${names.length === 1 ? one : several}: ${joinWords(names)}.`;
}

function explainNothingCounts(assessment: StatedAssessment): Explanation {
  const fields = wholeFields(assessment.fields);
  const alone = fields.filter((field) => field.counts && field.norm === 'L1'
    && !fields.some((other) => other.field === field.field && other.counts && other.norm !== 'L1'));
  if (alone.length > 0) {
    return {
      sentence: `Of ${joinWords(alone.map((field) => field.field))} only L1 counts, and L1 alone may not: it overlooks a wrong band one cell wide.`,
      nextStep: 'Let L2 or L∞ of the same field count as well.',
    };
  }
  const names = fields.map(nameSeries);
  return {
    sentence: names.length === 1 ? `The one norm assessed, ${names.join('')}, does not count.` : names.length > 0 ? `None of the ${names.length} norms assessed counts: ${joinWords(names)}.` : 'No field and norm counts towards an outcome.',
    nextStep: 'Let L2 or L∞ of at least one field count in the case.',
  };
}
