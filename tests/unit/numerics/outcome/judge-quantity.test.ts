import { describe, expect, it } from 'vitest';
import { errorSeriesOfQuantity } from '@/lib/numerics/outcome/error-series-of-quantity';
import { judgeErrorSeries } from '@/lib/numerics/outcome/judge-error-series';
import { judgeQuantity } from '@/lib/numerics/outcome/judge-quantity';
import { quantitySeries } from '../../../support/series';

const h = [1, 2, 4, 8];
const second = h.map((spacing) => 100 + 0.25 * spacing ** 2);
const declared = { formalOrder: 2, target: 0.01 };

describe('judgeQuantity(series)', () => {
  it('meets its target: monotone, both orders on the formal one, GCI within', () => {
    const found = judgeQuantity(quantitySeries(h, second, declared));
    expect(found).toMatchObject({ outcome: 'meets-target', reasons: ['within-target'], convergence: 'monotone', branch: 'observed', safetyFactor: 1.25, halfRange: null, formulaValue: null });
    expect(found.orderObserved).toBeCloseTo(2, 9);
    expect(found.extrapolated).toBeCloseTo(100, 9);
    expect(found.gciAbsolute).toBeCloseTo(0.3125, 9);
    expect(found.triples.map((triple) => triple.grids)).toEqual([['g1', 'g2', 'g3'], ['g2', 'g3', 'g4']]);
    expect(found.orderRange?.[0]).toBeLessThan(2);
  });

  it('misses its target where only the GCI is above', () => {
    expect(judgeQuantity(quantitySeries(h, second, { ...declared, target: 0.003 }))).toMatchObject({ outcome: 'misses-target', reasons: ['above-target'] });
  });

  it('is judged by one triple with three grids', () => {
    expect(judgeQuantity(quantitySeries(h.slice(0, 3), second.slice(0, 3), declared)).outcome).toBe('meets-target');
    expect(judgeQuantity(quantitySeries(h.slice(0, 3), second.slice(0, 3), { ...declared, minimumGrids: 4 })).reasons).toEqual(['too-few-grids']);
  });

  it('is inconclusive where an order is off the formal one, even of the coarser triple', () => {
    expect(judgeQuantity(quantitySeries(h, [...second.slice(0, 3), 120], declared))).toMatchObject({ outcome: 'inconclusive', reasons: ['order-off-formal'] });
  });

  it('gives half the range and no GCI where values oscillate or diverge', () => {
    const oscillating = judgeQuantity(quantitySeries([1, 2, 4], [100.2, 101.1, 98.4], declared));
    expect(oscillating).toMatchObject({ convergence: 'oscillatory', reasons: ['not-monotone'], gci: null, extrapolated: null, orderObserved: null, branch: 'none' });
    expect(oscillating.halfRange).toBeCloseTo(1.35, 12);
    expect(oscillating.formulaValue).toBeCloseTo(Math.log2(3), 9);
    const diverging = judgeQuantity(quantitySeries([1, 2, 4], [100, 104, 106], declared));
    expect(diverging).toMatchObject({ convergence: 'divergent', reasons: ['not-monotone'], gci: null, orderUsed: null, halfRange: 3 });
    expect(diverging.orderObserved).toBeCloseTo(-1, 9);
  });

  it('has no order where the digits show no change', () => {
    expect(judgeQuantity(quantitySeries([1, 2, 4], [1.23, 1.23, 1.25], declared))).toMatchObject({ convergence: 'unchanged', orderObserved: null, reasons: ['not-monotone'] });
    expect(judgeQuantity(quantitySeries([1, 2, 4], [1.231, 1.233, 1.241], { grids: [1, 2, 4].map((spacing, i) => ({ label: `g${i}`, h: spacing, value: [1.231, 1.233, 1.241][i] ?? 0, resolution: 0.01 })) })).convergence).toBe('unchanged');
  });

  it('assumes the formal order with two grids and a safety factor of 3', () => {
    const found = judgeQuantity(quantitySeries([1, 2], [101, 104], declared));
    expect(found).toMatchObject({ outcome: 'inconclusive', reasons: ['order-not-observed'], branch: 'formal-two-grids', orderObserved: null, orderUsed: 2, safetyFactor: 3, gciAbsolute: 3 });
    expect(found.extrapolated).toBeCloseTo(100, 12);
    expect(judgeQuantity(quantitySeries([1, 2], [101, 104]))).toMatchObject({ outcome: null, reasons: ['no-target'], branch: 'none', gci: null });
    expect(judgeQuantity(quantitySeries([1], [101], declared)).reasons).toEqual(['too-few-grids']);
  });

  it('shows figures of grids under a ratio of 1.3 apart, but does not judge them', () => {
    const close = [1, 1.1, 1.21];
    const found = judgeQuantity(quantitySeries(close, close.map((spacing) => 100 + spacing ** 2), declared));
    expect(found.orderObserved).toBeCloseTo(2, 6);
    expect(found.reasons).toEqual(['too-few-grids']);
  });

  it('does not hold a value near zero against a target in percent', () => {
    expect(judgeQuantity(quantitySeries(h, h.map((spacing) => 0.25 * spacing ** 2), { ...declared, target: 10 }))).toMatchObject({ outcome: 'inconclusive', reasons: ['no-target'] });
  });

  it('is null without a target or a formal order, with all figures', () => {
    const found = judgeQuantity(quantitySeries(h, second, { formalOrder: 2 }));
    expect(found).toMatchObject({ outcome: null, reasons: ['no-target'] });
    expect(found.gci).toBeCloseTo(0.3125 / 100.25, 9);
  });

  it('is order-out-of-range where no order between −10 and 20 fits', () => {
    expect(judgeQuantity(quantitySeries([1, 2, 4], [1.000001, 1.000003, 10.0000001], declared)).reasons).toEqual(['order-out-of-range']);
  });

  it('throws for a value that is not finite, naming it', () => {
    expect(() => judgeQuantity(quantitySeries([1, 2], [Number.NaN, 1]))).toThrow('value of drag on grid g1 must be finite, got NaN');
  });
});

describe('errorSeriesOfQuantity(quantity, known value)', () => {
  it('is judged by its errors, with half units of the digits as known errors', () => {
    const series = errorSeriesOfQuantity(quantitySeries(h, second, { formalOrder: 2, minimumGrids: 4, grids: h.map((spacing, i) => ({ label: `g${i + 1}`, h: spacing, value: second[i] ?? 0, resolution: null, iterativeError: i === 0 ? 0.01 : 0 })) }), 100);
    expect(series).toMatchObject({ field: 'drag', norm: 'value', scale: 100, counts: true });
    expect(series.grids.map((grid) => grid.error)).toEqual([0.25, 1, 4, 16]);
    expect(series.grids[0]?.knownError).toBeCloseTo(0.015, 12);
    expect(judgeErrorSeries({ ...series, grids: series.grids.map((grid) => ({ ...grid, knownError: 0 })) })).toMatchObject({ outcome: 'pass', norm: 'value' });
  });
  it('throws for a known value that is not finite', () => {
    expect(() => errorSeriesOfQuantity(quantitySeries(h, second), Number.NaN)).toThrow('known value of drag must be finite, got NaN');
  });
});
