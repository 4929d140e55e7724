import type { FieldAssessment, QuantityAssessment } from '@/lib/numerics/assessment';
import type { OutcomeAnswer } from '../studies/schema';
import { explainStudy } from './explain-study';
import { explainField, explainQuantity } from './reason-text';
import { wholeFields } from './whole-fields';

type Verdict = { kind: 'pass' } | { kind: 'failure' | 'skipped' | 'error'; type: string };
interface TestCase { name: string; verdict: Verdict; text: string }

const escapes: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&apos;', '\n': '&#10;', '\t': '&#9;' };

/** What XML 1.0 cannot hold at all is left out. */
function escape(text: string): string {
  return text.replace(/[^\t\n -\uD7FF\uE000-\uFFFD\u{10000}-\u{10FFFF}]/gu, '').replace(/[&<>"'\n\t]/g, (character) => escapes[character] ?? '');
}

function verdictOf({ outcome, counts }: { outcome: FieldAssessment['outcome']; counts: boolean }, inconclusive: 'fail' | 'skip'): Verdict {
  if (outcome === null) return { kind: 'skipped', type: 'not judged' };
  if (outcome === 'pass' || outcome === 'meets-target') return { kind: 'pass' };
  if (!counts) return { kind: 'skipped', type: `${outcome}, does not count` };
  if (outcome === 'inconclusive' && inconclusive === 'skip') return { kind: 'skipped', type: 'inconclusive' };
  return { kind: 'failure', type: outcome };
}

function testCases({ outcome, assessment }: OutcomeAnswer, inconclusive: 'fail' | 'skip'): TestCase[] {
  const { quantities } = assessment;
  const texts = (explanations: { sentence: string; nextStep: string }[]) => explanations.map(({ sentence, nextStep }) => `${sentence} ${nextStep}`).join(' ');
  const cases = [
    ...wholeFields(assessment.fields).map((field: FieldAssessment) => ({
      name: `${field.field} ${field.norm}`, verdict: verdictOf(field, inconclusive), text: texts(explainField(field)),
    })),
    ...quantities.map((quantity: QuantityAssessment) => ({
      name: quantity.name, verdict: verdictOf({ ...quantity, counts: true }, inconclusive), text: texts(explainQuantity(quantity)),
    })),
  ];
  if (cases.length === 0) return [{ name: 'study', verdict: { kind: 'error', type: 'not-run' }, text: 'The case declares nothing that could be assessed.' }];
  // Inconclusive since nothing counts: the parts alone would be skipped, and the pipeline green.
  const whole = verdictOf({ outcome, counts: true }, inconclusive);
  if (whole.kind !== 'failure' || cases.some(({ verdict }) => verdict.kind === 'failure')) return cases;
  return [{ name: 'study', verdict: whole, text: texts(explainStudy(assessment)) }, ...cases];
}

function formatCase({ name, verdict, text }: TestCase, suite: string): string {
  const head = `    <testcase classname="${escape(suite)}" name="${escape(name)}"`;
  if (verdict.kind === 'pass') return `${head}/>`;
  const body = verdict.kind === 'skipped'
    ? `<skipped message="${escape(`${verdict.type}: ${text}`)}"/>`
    : `<${verdict.kind} type="${escape(verdict.type)}" message="${escape(text)}"/>`;
  return `${head}>\n      ${body}\n    </testcase>`;
}

/**
 * The outcome as JUnit XML: a test case for every field and norm and every quantity. Fail and missed target are failures;
 * inconclusive is a failure of that type, or skipped where so asked; what does not count or is not judged is skipped. A
 * study whose outcome no part shows has a test case of its own.
 */
export function formatJunit(answer: OutcomeAnswer, inconclusive: 'fail' | 'skip'): string {
  const suite = `${answer.code}.${answer.release}.${answer.case}`;
  const cases = testCases(answer, inconclusive);
  const count = (kind: Verdict['kind']) => cases.filter(({ verdict }) => verdict.kind === kind).length;
  const counts = `tests="${cases.length}" failures="${count('failure')}" errors="${count('error')}" skipped="${count('skipped')}"`;
  return [
    '<?xml version="1.0" encoding="UTF-8"?>',
    `<testsuites name="fourfold" ${counts}>`,
    `  <testsuite name="${escape(suite)}" ${counts}>`,
    ...cases.map((one) => formatCase(one, suite)),
    '  </testsuite>',
    '</testsuites>',
    '',
  ].join('\n');
}
