import { describe, expect, it } from 'vitest';
import { defaultTolerance } from '@/lib/numerics/outcome/default-tolerance';
import { judgeErrorSeries } from '@/lib/numerics/outcome/judge-error-series';
import { orderRule } from '@/lib/numerics/outcome/order-rule';
import { errorSeries } from '../../../support/series';

const halvings = [1, 0.5, 0.25, 0.125];
const quarters = [1, 0.25, 0.0625, 0.015625];

describe('judgeErrorSeries(series)', () => {
  it('answers finest first with orders, fit, relative errors and the effective tolerance', () => {
    const series = errorSeries(halvings, quarters);
    series.grids.forEach((grid) => { grid.exactNorm = 2; });
    const found = judgeErrorSeries(series);
    expect(found).toMatchObject({ outcome: 'pass', reasons: ['in-band'], tolerance: 0.1, region: 'all' });
    expect(found.grids.map((grid) => grid.label)).toEqual(['g4', 'g3', 'g2', 'g1']);
    expect(found.grids[0]).toMatchObject({ error: 0.015625, relativeError: 0.0078125, used: true });
    expect(found.orders).toHaveLength(3);
    expect(found.orders[0]).toEqual({ coarse: 'g3', fine: 'g4', ratio: 2, order: 2, uncertainty: 0 });
    expect(found.fit?.order).toBeCloseTo(2, 12);
  });

  it('is null with no-target without a formal order, and still gives the orders', () => {
    expect(judgeErrorSeries(errorSeries(halvings, quarters, { formalOrder: null }))).toMatchObject({ outcome: null, reasons: ['no-target'], tolerance: null });
    expect(judgeErrorSeries(errorSeries(halvings, [0, 0, 0, 0], { formalOrder: null })).reasons).toEqual(['no-target']);
  });

  it('judges exactness without a formal order where it is expected', () => {
    expect(judgeErrorSeries(errorSeries(halvings, [0, 0, 0, 0], { formalOrder: null, expectExact: true }))).toMatchObject({ outcome: 'pass', reasons: ['exact'] });
  });

  it('takes scale 1 for a field that is zero everywhere, as the cross flow of a free stream', () => {
    const noise = [2e-17, 3e-17, 1e-17, 4e-17];
    expect(judgeErrorSeries(errorSeries(halvings, noise, { expectExact: true, scale: 0 })).reasons).toEqual(['exact']);
  });

  it('takes an exact limit stated for exactness, and the scale of the field for round-off', () => {
    const errors = [1e-9, 2e-9, 1e-9, 3e-9];
    expect(judgeErrorSeries(errorSeries(halvings, errors, { expectExact: true })).reasons).toEqual(['not-exact']);
    expect(judgeErrorSeries(errorSeries(halvings, errors, { expectExact: true, exactLimit: 1e-8 })).reasons).toEqual(['exact']);
    expect(judgeErrorSeries(errorSeries(halvings, errors, { expectExact: true, scale: 1e6 })).reasons).toEqual(['exact']);
    expect(judgeErrorSeries(errorSeries(halvings, errors, { expectExact: true, precision: 'single' })).reasons).toEqual(['exact']);
  });

  it('drops trailing grids on the floor with the reason, and none in between', () => {
    const found = judgeErrorSeries(errorSeries([1, 0.5, 0.25, 0.125, 0.0625, 0.03125], [1, 0.25, 1e-15, 0.015625, 1e-3, 1e-15], { knownErrors: [0, 0, 0, 0, 1e-4, 0], minimumGrids: 3 }));
    expect(found.grids.map((grid) => grid.unusedReason)).toEqual(['round-off', 'known-error', undefined, undefined, undefined, undefined]);
  });

  it('is scatter where an error of 0 comes before a nonzero one', () => {
    expect(judgeErrorSeries(errorSeries(halvings, [1, 0, 0.0625, 0.015625])).reasons).toEqual(['scatter']);
  });

  it('needs the grids asked for, a ratio of 2 overall and two pairs', () => {
    expect(judgeErrorSeries(errorSeries([1, 0.5, 0.25], [1, 0.25, 0.0625])).reasons).toEqual(['too-few-grids']);
    expect(judgeErrorSeries(errorSeries([1, 0.76, 0.7, 0.58], [1, 0.5, 0.45, 0.3])).reasons).toEqual(['too-few-grids']);
    expect(judgeErrorSeries(errorSeries([1, 0.9, 0.8, 0.45], [1, 0.81, 0.64, 0.2])).reasons).toEqual(['too-few-grids']);
    expect(judgeErrorSeries(errorSeries([], [])).reasons).toEqual(['too-few-grids']);
    expect(judgeErrorSeries(errorSeries([], [], { expectExact: true })).reasons).toEqual(['too-few-grids']);
  });

  it('is inconclusive for order 3 and more while nobody said where values live', () => {
    const cubes = halvings.map((h) => h ** 3);
    expect(judgeErrorSeries(errorSeries(halvings, cubes, { formalOrder: 3, samplingStated: false })).reasons).toEqual(['sampling-not-stated']);
    expect(judgeErrorSeries(errorSeries(halvings, cubes, { formalOrder: 3 })).reasons).toEqual(['in-band']);
    expect(judgeErrorSeries(errorSeries(halvings, quarters, { samplingStated: false })).reasons).toEqual(['in-band']);
  });

  it('judges by a derived order where one is declared, and shows both', () => {
    const cubes = halvings.map((h) => h ** 3);
    expect(judgeErrorSeries(errorSeries(halvings, cubes)).reasons).toEqual(['above-formal']);
    expect(judgeErrorSeries(errorSeries(halvings, cubes, { derivedOrder: 3 }))).toMatchObject({ outcome: 'pass', formalOrder: 2, derivedOrder: 3, tolerance: 0.15000000000000002 });
  });

  it('throws for errors and spacings that cannot be, naming field, norm and grid', () => {
    expect(() => judgeErrorSeries(errorSeries([1], [-1]))).toThrow('error of u (L2) on grid g1 must be 0 or above, got -1');
    expect(() => judgeErrorSeries(errorSeries([1, 1], [1, 1]))).toThrow('h of u (L2) on grid g2 must exceed that of the finer grid, got 1');
    expect(() => judgeErrorSeries(errorSeries([1], [1], { knownErrors: [Number.NaN] }))).toThrow('knownError of u (L2) on grid g1');
  });
});

describe('defaultTolerance(norm, formal order)', () => {
  it.each([['L2', 1, 0.1], ['L2', 4, 0.2], ['Linf', 1, 0.2], ['Linf', 4, 0.4], ['value', 2, 0.1]] as const)('%s, order %d: %d', (norm, order, tolerance) => {
    expect(defaultTolerance(norm, order)).toBeCloseTo(tolerance, 12);
  });
});

describe('orderRule({pairs, errors}, formal order, tolerance)', () => {
  const rule = (orders: number[], uncertainty = 0, errors = [4, 3, 2, 1]) => orderRule({ pairs: orders.map((order) => ({ order, uncertainty })), errors }, 2, 0.1).reason;
  it('takes the band from pf − tol to pf + 2 tol', () => {
    expect(rule([1.91, 2.19, 2.19])).toBe('in-band');
    expect(rule([1.91, 1.91, 2.21])).toBe('above-formal');
    expect(rule([1.5, 1.95, 1.94])).toBe('in-band');
  });
  it('sees two pairs depart from a quarter of the tolerance on', () => {
    expect(rule([2, 1.976])).toBe('in-band');
    expect(rule([2, 1.974])).toBe('departing');
  });
  it('needs four climbing pairs to fail by their limit', () => {
    expect(rule([1.0, 1.4, 1.6])).toBe('climbing');
    expect(rule([1.0, 1.4, 1.6, 1.7])).toBe('limit-below-formal');
    expect(rule([1.6, 1.2, 1.4, 1.6])).toBe('climbing');
  });
  it('throws with one pair', () => expect(() => rule([2])).toThrow('pairs must be two or more, got 1'));
});
