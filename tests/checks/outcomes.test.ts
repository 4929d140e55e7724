import { describe, expect, it } from 'vitest';
import { explainField } from '@/lib/domain/assessment/reason-text';
import { stateOutcome } from '@/lib/domain/assessment/state-outcome';
import type { Norm } from '@/lib/numerics/assessment';
import { assessSeries } from '@/lib/numerics/assess-series';
import { errorSeries } from '../support/series';
import { readReference } from './reference';

interface Case {
  note: string; h: number[]; errors: number[]; formalOrder: number; outcome: string; reason: string; norm: Norm; minimumGrids: number;
  iterativeError?: number[]; expectExact?: boolean;
}

// Invented sequences, judged by an independent reference of the rule: one or more for every branch.
const { cases } = readReference<{ cases: Case[] }>('outcomes.json');

describe('assessSeries judges the reference sequences', () => {
  it('holds all 34', () => expect(cases).toHaveLength(34));
  it.each(cases)('$note is $outcome, $reason', (row) => {
    const { formalOrder, norm, minimumGrids, expectExact = false } = row;
    const series = errorSeries(row.h, row.errors, { formalOrder, norm, minimumGrids, expectExact, knownErrors: row.iterativeError });
    const assessment = assessSeries({ errors: [series], quantities: [] });
    expect(assessment.fields[0]).toMatchObject({ outcome: row.outcome, reasons: [row.reason] });
    expect(assessment).toMatchObject({ outcome: row.outcome, reasons: [row.reason] });
    // What a reader is told names the numbers and leaves no blank.
    const told = [stateOutcome(assessment).sentence, ...assessment.fields.flatMap(explainField).map(({ sentence }) => sentence)];
    for (const sentence of told) expect(sentence).toMatch(/^[^–]*\d[^–]*\.$/);
  });
});
