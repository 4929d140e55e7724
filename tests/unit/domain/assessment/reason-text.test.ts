import { describe, expect, it } from 'vitest';
import { explainStudy } from '@/lib/domain/assessment/explain-study';
import { explainField, explainQuantity } from '@/lib/domain/assessment/reason-text';
import { formatPercent } from '@/lib/domain/numbers/format-percent';
import { assessSeries } from '@/lib/numerics/assess-series';
import { reasonCodes, type ErrorSeries, type FieldAssessment, type QuantityAssessment, type ReasonCode } from '@/lib/numerics/assessment';
import { judgeErrorSeries } from '@/lib/numerics/outcome/judge-error-series';
import { judgeQuantity } from '@/lib/numerics/outcome/judge-quantity';
import { errorSeries, quantitySeries } from '../../../support/series';

const h = [1, 0.5, 0.25, 0.125, 0.0625];
const field: FieldAssessment = judgeErrorSeries(errorSeries(h, [0.9, 0.62, 0.21, 0.055, 0.0138], { knownErrors: [0, 0, 0, 0, 1e-5] }));
const quantity: QuantityAssessment = judgeQuantity(quantitySeries([1, 2, 4], [100.25, 101, 104], { formalOrder: 2, target: 0.01, unit: 'N' }));

const target = { formalOrder: 2, target: 0.01 };
const ofQuantities: [ReasonCode, h: number[], values: number[]][] = [
  ['within-target', [1, 2, 4], [100.25, 101, 104]], ['above-target', [1, 2, 4], [10.25, 11, 14]], ['not-monotone', [1, 2, 4], [100.2, 101.1, 98.4]],
  ['order-off-formal', [1, 2, 4], [100.5, 101, 102.1]], ['order-not-observed', [1, 2], [101, 104]], ['order-out-of-range', [1, 2, 4], [1.000001, 1.000003, 10.0000001]],
  ['too-few-grids', [1, 1.3, 1.7], [100.1, 101.01, 105.2]], ['no-target', [1, 2, 4], [0.251, 1.001, 4.003]],
];
const ofQuantitiesOnly = new Set<ReasonCode>(['within-target', 'above-target', 'not-monotone', 'order-off-formal', 'order-not-observed', 'order-out-of-range']);
const fieldCodes = reasonCodes.filter((code) => code !== 'nothing-counts' && !ofQuantitiesOnly.has(code));

describe('every reason code', () => {
  it.each(fieldCodes)('%s of a field has a sentence with numbers and a next step', (code) => {
    const [text] = explainField({ ...field, reasons: [code] });
    expect(text?.sentence).toMatch(/\d.*\.$/);
    expect(text?.nextStep).toMatch(/\w.*\.$/);
    expect(`${text?.sentence}${text?.nextStep}`).not.toMatch(/undefined|NaN|null|!/);
  });
  it.each(ofQuantities)('%s of a quantity has a sentence with its numbers and a next step', (code, spacings, values) => {
    const judged = judgeQuantity(quantitySeries(spacings, values, target));
    expect(judged.reasons).toEqual([code]);
    const [text] = explainQuantity(judged);
    expect(text?.sentence).toMatch(/\d.*\.$/);
    expect(text?.nextStep).toMatch(/\w.*\.$/);
    expect(`${text?.sentence}${text?.nextStep}`).not.toMatch(/undefined|NaN|null|–|!/);
  });
  it('of the other kind throws, naming it', () => {
    expect(() => explainField({ ...field, reasons: ['within-target'] })).toThrow('reason of a field must be one that fields have, got within-target');
    expect(() => explainQuantity({ ...quantity, reasons: ['in-band'] })).toThrow('reason of a quantity must be one that quantities have, got in-band');
  });
});

describe('not-similar', () => {
  const dissimilar = [
    { coarse: 'g2', fine: 'g1', low: 1, median: 1.4142, high: 2, isAlike: false }, { coarse: 'g3', fine: 'g2', low: null, median: null, high: null, directions: [2, 1], isAlike: false },
  ];
  it('gives the pairs with their figures, of a field and of a quantity', () => {
    const errors = errorSeries([1, 0.5, 0.25, 0.125], [1, 0.25, 0.0625, 0.015625], { dissimilar });
    const values = quantitySeries([1, 2, 4], [100.25, 101, 104], { formalOrder: 2, target: 0.01, dissimilar });
    const told = 'but the grids are not refined alike everywhere: from g2 to g1 cells shrink by 1.00 to 2.00 (5 and 95 % of the domain, median 1.41); from g3 to g2 cells shrink by 2.00 along x and 1.00 along y.';
    expect(judgeErrorSeries(errors)).toMatchObject({ outcome: 'inconclusive', reasons: ['not-similar'], dissimilar });
    expect(explainField(judgeErrorSeries(errors))[0]?.sentence).toBe(`The last two pairs show orders 2.00 and 2.00 against a band of 1.90 to 2.20, ${told}`);
    expect(judgeQuantity(values)).toMatchObject({ outcome: 'inconclusive', reasons: ['not-similar'] });
    expect(explainQuantity(judgeQuantity(values))[0]?.sentence).toContain(`within the target of ${formatPercent(0.01)}, ${told}`);
  });
  it('leaves a fail and a missed target as they are', () => {
    expect(judgeErrorSeries(errorSeries([1, 0.5, 0.25, 0.125], [1, 0.5, 0.25, 0.125], { dissimilar }))).toMatchObject({ outcome: 'fail', reasons: ['below-formal'] });
    expect(judgeQuantity(quantitySeries([1, 2, 4], [10.25, 11, 14], { formalOrder: 2, target: 0.01, dissimilar })).outcome).toBe('misses-target');
  });
});

describe('explainField(field)', () => {
  it('quotes orders with three decimals near a limit of the band', () => {
    const near = judgeErrorSeries(errorSeries([1, 0.5, 0.25, 0.125], [0, 1, 2, 3].map((i) => 2 ** (-1.905 * i))));
    expect(explainField(near)[0]?.sentence).toBe('The last two pairs show orders 1.905 and 1.905, both within 1.90 to 2.20.');
  });
  it('names the grids on the floor, coarse to fine', () => {
    const floored = judgeErrorSeries(errorSeries([1, 0.5, 0.25, 0.125], [1, 0.25, 0.06, 0.05], { knownErrors: [0, 0, 0.01, 0.01] }));
    expect(explainField(floored)[0]?.sentence).toBe('2 of 4 grids can be used, because the L2 error of u is no more than 20 times its known error on g3 and g4; they give 1 pair at a ratio of 1.3 or more, where two pairs are needed.');
  });
  it('puts the uncertainty beside an order that it keeps from its band', () => {
    const uncertain = judgeErrorSeries(errorSeries([1, 0.5, 0.25, 0.125], [1, 0.25, 0.0625, 0.015625], { knownErrors: [0.04, 0.008, 0, 0] }));
    expect(explainField({ ...uncertain, reasons: ['one-pair-only'] })[0]?.sentence).toBe('Of the last two pairs only the finest lies surely in the band of 1.90 to 2.20: order 2.00, after 2.00 ± 0.046. Two consecutive pairs are needed.');
    const barely = judgeErrorSeries(errorSeries([1, 0.5, 0.25, 0.125], [0, 1, 2, 3].map((i) => 2 ** (-1.9 * i)), { knownErrors: [0, 0, 0, 1e-5] }));
    expect(barely.reasons).toEqual(['within-uncertainty']);
    expect(explainField(barely)[0]?.sentence).toBe('The finest pair shows order 1.900 ± 0.00075, too uncertain for the band of 1.90 to 2.20.');
  });
  it('tells a gap that closes too slowly from one that does not close, and errors that do not fall', () => {
    const orders = (...seen: number[]) => judgeErrorSeries(errorSeries(h, [0, ...seen].map((_, i) => 2 ** -seen.slice(0, i).reduce((sum, p) => sum + p, 0))));
    expect(explainField(orders(1, 1, 1, 1.1))[0]?.sentence).toMatch(/goes from 1\.000 to 0\.900 and closes too slowly\.$/);
    expect(explainField(orders(1, 1, 1.1, 1))[0]?.sentence).toMatch(/goes from 0\.900 to 1\.000 and does not close\.$/);
    expect(explainField(orders(0.3, 0.2, 0.2, 0.1))[0]?.nextStep).toMatch(/^The error hardly falls\./);
    expect(explainField(orders(0.3, 0.2, 0.2, -0.1))[0]?.nextStep).toMatch(/^The error does not fall\./);
  });
  it('calls a derived order by its name', () => {
    const above = judgeErrorSeries(errorSeries([1, 0.5, 0.25, 0.125], [0, 1, 2, 3].map((i) => 2 ** (-4 * i)), { derivedOrder: 3 }));
    expect(explainField(above)[0]?.sentence).toBe('The finest pair shows order 4.00, above 3.30: more than derived order 3 explains.');
  });
  it('counts one grid and none in words that fit', () => {
    expect(explainField(judgeErrorSeries(errorSeries([1], [1])))[0]?.sentence).toBe('There is 1 grid; it gives no pair at a ratio of 1.3 or more, where two pairs are needed.');
    expect(explainField(judgeErrorSeries(errorSeries([], [])))[0]?.sentence).toBe('No grid has the L2 error of u.');
  });
  it('says L∞, and the name alone for a known value', () => {
    expect(explainField(judgeErrorSeries(errorSeries([1], [1e-3], { norm: 'Linf', expectExact: true })))[0]?.sentence).toMatch(/^The L∞ error of u is/);
    expect(explainField(judgeErrorSeries(errorSeries([1], [1e-3], { norm: 'value', field: 'drag', expectExact: true })))[0]?.sentence).toMatch(/^The error of drag is/);
  });
});

describe('explainQuantity(quantity)', () => {
  it('puts the GCI with the formal order beside one that a high order shrinks', () => {
    const high = judgeQuantity(quantitySeries([1, 2, 4], [100, 100.4, 102.1], { formalOrder: 2, target: 0.01 }));
    expect(explainQuantity(high)[0]?.sentence).toBe('The GCI of the finest grid is 0.15\u202F%, within the target of 1.0\u202F%; the three grids show order 2.09. An order above the formal one shrinks the GCI: with order 2 it would be 0.17\u202F%.');
  });
  it('states a GCI in the unit wherever the value is near zero or zero', () => {
    const nearZero = judgeQuantity(quantitySeries([1, 2, 4], [0.5, 1, 2], { formalOrder: 2, target: 0.01, unit: 'N' }));
    expect(explainQuantity(nearZero)[0]?.sentence).toBe('The three grids show order 1.00, where formal order 2 is declared: the GCI of 0.63 N is not held against the target.');
    const zero = judgeQuantity(quantitySeries([1, 2], [0, 1], { formalOrder: 2, target: 0.01 }));
    expect(explainQuantity(zero)[0]?.sentence).toBe('Two grids show no order: a GCI of 1.0 assumes formal order 2 and takes a safety factor of 3.');
  });
  it('says that no grid has a value', () => {
    expect(explainQuantity(judgeQuantity(quantitySeries([], [], { formalOrder: 2, target: 0.01 })))[0]?.sentence).toBe('No grid has a value of drag.');
  });
  it('says what is not declared', () => {
    expect(explainQuantity({ ...quantity, formalOrder: null, target: null, reasons: ['no-target'] })[0]?.sentence).toBe('No formal order and no target is declared for drag, so it is not judged; order 2.00 is observed.');
  });
});

describe('explainStudy(assessment)', () => {
  const second = (changes: Partial<ErrorSeries> = {}) => errorSeries(h, [1, 0.25, 0.0625, 0.015625, 0.00390625], changes);
  const study = (...errors: ErrorSeries[]) => explainStudy(assessSeries({ errors, quantities: [] }))[0]?.sentence;
  it('counts what made the outcome', () => {
    expect(study(second(), second({ norm: 'L1' }), second({ norm: 'Linf' }))).toBe('All 3 norms that count pass.');
    expect(study(second(), errorSeries(h, h, { field: 'v' }), second({ norm: 'Linf' }))).toBe('1 of 3 norms that count fails: L2 of v.');
    expect(study(second(), second({ field: 'v', minimumGrids: 6 }), second({ field: 'w', minimumGrids: 6 }))).toBe('2 of 3 norms that count are inconclusive: L2 of v and L2 of w.');
  });
  it('says that nothing counts, or L1 alone', () => {
    expect(study(second({ counts: false }))).toBe('The one norm assessed, L2 of u, does not count.');
    expect(study(second({ norm: 'L1' }))).toBe('Of u only L1 counts, and L1 alone may not: it overlooks a wrong band one cell wide.');
    expect(study()).toBe('No field and norm counts towards an outcome.');
  });
  it('speaks of quantities where they decide, and says when nothing is judged', () => {
    expect(explainStudy(assessSeries({ errors: [], quantities: [quantitySeries([1, 2, 4], [100.25, 101, 104], { formalOrder: 2, target: 0.01 })] }))[0]?.sentence).toBe('The one quantity, drag, meets its target.');
    expect(study(second({ formalOrder: null }))).toBe('Nothing here is judged.');
  });
});
