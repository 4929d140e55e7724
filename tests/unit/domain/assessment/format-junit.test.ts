import { describe, expect, it } from 'vitest';
import { formatJunit } from '@/lib/domain/assessment/format-junit';
import type { OutcomeAnswer } from '@/lib/domain/studies/schema';
import { assessSeries } from '@/lib/numerics/assess-series';
import { errorSeries } from '@/tests/support/series';
import { checkWellFormed } from '@/tests/support/xml';

const h = [0.1, 0.05, 0.025, 0.0125];
const series = (field: string, order: number, more: Parameters<typeof errorSeries>[2] = {}) => errorSeries(h, h.map((one) => one ** order), { field, ...more });

function answerOf(errors: ReturnType<typeof errorSeries>[]): OutcomeAnswer {
  const assessment = { ...assessSeries({ errors, quantities: [] }), patterns: [], inputs: [], inputsSha256: '' };
  return { study: 's', revision: 1, code: 'brack', release: '1.0', case: 'heat', outcome: assessment.outcome, reasons: assessment.reasons, assessment };
}

describe('formatJunit', () => {
  it('has a test case for every field and norm, a failure where it fails', () => {
    const xml = formatJunit(answerOf([series('u', 2), series('v', 1)]), 'fail');
    checkWellFormed(xml);
    expect(xml).toContain('tests="2" failures="1" errors="0" skipped="0"');
    expect(xml).toContain('<testcase classname="brack.1.0.heat" name="u L2"/>');
    expect(xml).toContain('<failure type="fail" message="');
  });

  it('makes inconclusive a failure of that type, or skips it where asked to', () => {
    const answer = answerOf([errorSeries(h.slice(0, 3), [1e-2, 2.5e-3, 6e-4])]);
    expect(formatJunit(answer, 'fail')).toContain('<failure type="inconclusive"');
    expect(formatJunit(answer, 'skip')).toContain('failures="0" errors="0" skipped="1"');
  });

  it('skips what does not count and what is not judged', () => {
    const xml = formatJunit(answerOf([series('u', 2), series('v', 1, { counts: false }), series('w', 2, { formalOrder: null })]), 'fail');
    expect(xml).toContain('failures="0" errors="0" skipped="2"');
  });

  it('is an error where nothing could be run', () => {
    expect(formatJunit(answerOf([]), 'fail')).toContain('errors="1"');
  });

  it('fails where nothing counts, though every part passes or is skipped', () => {
    const xml = formatJunit(answerOf([series('u', 2, { counts: false }), series('v', 2, { norm: 'L1' })]), 'fail');
    checkWellFormed(xml);
    expect(xml).toContain('tests="3" failures="1" errors="0" skipped="0"');
    expect(xml).toMatch(/name="study">\s+<failure type="inconclusive" message="[^"]+"/);
  });

  it('stays XML whatever a name holds', () => {
    checkWellFormed(formatJunit({ ...answerOf([series('u', 1)]), case: 'a<b>&"c\u0007\'\ud800\uffff' }, 'fail'));
  });
});
