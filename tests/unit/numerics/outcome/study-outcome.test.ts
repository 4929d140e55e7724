import { describe, expect, it } from 'vitest';
import { assessSeries } from '@/lib/numerics/assess-series';
import type { ErrorSeries, QuantitySeries } from '@/lib/numerics/assessment';
import { numericsVersion } from '@/lib/numerics/version';
import { errorSeries, quantitySeries } from '../../../support/series';

const h = [1, 0.5, 0.25, 0.125];
const second = (changes: Partial<ErrorSeries> = {}) => errorSeries(h, [1, 0.25, 0.0625, 0.015625], changes);
const first = (changes: Partial<ErrorSeries> = {}) => errorSeries(h, h, changes);
const quantity = (changes: Partial<QuantitySeries> = {}) => quantitySeries([1, 2, 4], [100.25, 101, 104], { formalOrder: 2, target: 0.01, ...changes });
const judge = (errors: ErrorSeries[], quantities: QuantitySeries[] = []) => {
  const { outcome, reasons } = assessSeries({ errors, quantities });
  return [outcome, ...reasons];
};

describe('the outcome of a study', () => {
  it('carries the version of the numerics', () => expect(assessSeries({ errors: [], quantities: [] }).numericsVersion).toBe(numericsVersion));
  it('is pass when all that counts passes', () => expect(judge([second(), first({ field: 'v', counts: false })])).toEqual(['pass', 'in-band']));
  it('is fail when anything that counts fails', () => expect(judge([second(), first({ field: 'v' })])).toEqual(['fail', 'below-formal']));
  it('is inconclusive otherwise, with the reasons of what is', () => {
    expect(judge([second(), second({ field: 'v', minimumGrids: 5 })])).toEqual(['inconclusive', 'too-few-grids']);
  });
  it('is inconclusive where nothing counts', () => {
    expect(judge([second({ counts: false })])).toEqual(['inconclusive', 'nothing-counts']);
    expect(judge([])).toEqual(['inconclusive', 'nothing-counts']);
  });
  it('does not let L1 alone count', () => {
    expect(judge([second({ norm: 'L1' })])).toEqual(['inconclusive', 'nothing-counts']);
    expect(judge([second({ norm: 'L1' }), second({ norm: 'L2', counts: false })])).toEqual(['inconclusive', 'nothing-counts']);
    expect(judge([second({ norm: 'L1' }), second({ field: 'v' })])).toEqual(['inconclusive', 'nothing-counts']);
    expect(judge([first({ norm: 'L1' }), second({ field: 'v' })])).toEqual(['fail', 'below-formal']);
    expect(judge([second({ norm: 'L1' }), second({ norm: 'Linf' })])).toEqual(['pass', 'in-band']);
  });
  it('has no outcome where nothing has a target', () => {
    expect(judge([second({ formalOrder: null })], [quantity({ target: null })])).toEqual([null, 'no-target']);
  });
  it('is in the words of quantities where only they are judged', () => {
    expect(judge([], [quantity()])).toEqual(['meets-target', 'within-target']);
    expect(judge([], [quantity(), quantity({ name: 'lift', target: 1e-6 })])).toEqual(['misses-target', 'above-target']);
    expect(judge([], [quantity(), quantity({ name: 'lift', formalOrder: 1 })])).toEqual(['inconclusive', 'order-off-formal']);
  });
  it('is not decided by quantities where a field counts', () => {
    expect(judge([second()], [quantity({ target: 1e-6 })])).toEqual(['pass', 'in-band']);
  });
});

it('assessSeries takes well under 5 ms for 10 grids', () => {
  const spacings = Array.from({ length: 10 }, (_, i) => 0.7 ** i);
  const input = {
    errors: [errorSeries(spacings, spacings.map((spacing) => spacing ** 2))],
    quantities: [quantitySeries([...spacings].reverse(), spacings.map((spacing) => 1 + spacing ** 2).reverse(), { formalOrder: 2, target: 0.01 })],
  };
  const runs = 200;
  for (let i = 0; i < runs; i += 1) assessSeries(input);
  const begin = performance.now();
  for (let i = 0; i < runs; i += 1) assessSeries(input);
  expect((performance.now() - begin) / runs).toBeLessThan(5);
});
