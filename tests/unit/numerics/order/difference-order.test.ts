import { describe, expect, it } from 'vitest';
import type { ErrorSeries } from '@/lib/numerics/assessment';
import { differenceOrder } from '@/lib/numerics/order/difference-order';
import { judgeErrorSeries } from '@/lib/numerics/outcome/judge-error-series';

/** Norm of the difference of two solutions with the errors C·h^p, from the closed form. */
const difference = (fine: number, coarse: number, p: number) => ({ h: fine, error: 3 * (coarse ** p - fine ** p), knownError: 0 });

function series(h: number[], p: number, changes: Partial<ErrorSeries> = {}): ErrorSeries {
  const grids = h.slice(1).map((coarse, index) => {
    const fine = h[index]!;
    return { label: `g${index + 1}`, ...difference(fine, coarse, p), exactNorm: null, at: null };
  });
  return {
    field: 'u', norm: 'L2', grids, comparedTo: { label: `g${h.length}`, h: h.at(-1)! }, formalOrder: 2, derivedOrder: null, tolerance: null, counts: true,
    expectExact: false, exactLimit: null, scale: null, precision: 'double', minimumGrids: 4, samplingStated: true, ...changes,
  };
}

describe('differenceOrder(fine, coarse, coarsest)', () => {
  it('is p where errors are C·h^p, with one ratio and with mixed ratios', () => {
    for (const [h1, h2, h3, p] of [[1, 2, 4, 2], [1, 1.5, 3.3, 1.7], [1, 3, 4.2, 0.4], [0.1, 0.2, 0.3, 4]] as const) {
      expect(differenceOrder(difference(h1, h2, p), difference(h2, h3, p), h3).order).toBeCloseTo(p, 9);
    }
  });
  it('moves by its uncertainty where the norms move by their known errors, opposite to each other', () => {
    const known = 1e-6;
    const [fine, coarse] = [{ ...difference(1, 1.5, 2), knownError: known }, { ...difference(1.5, 3.3, 2), knownError: known }];
    const moved = differenceOrder({ ...fine, error: fine.error - known }, { ...coarse, error: coarse.error + known }, 3.3).order!;
    const { order, uncertainty } = differenceOrder(fine, coarse, 3.3);
    expect((moved - order!) / uncertainty!).toBeCloseTo(1, 5);
  });
  it('is null where a difference is 0 or no order explains them', () => {
    expect(differenceOrder({ h: 1, error: 0, knownError: 0 }, difference(2, 4, 2), 4)).toEqual({ order: null, uncertainty: null });
    expect(differenceOrder({ h: 1, error: 1, knownError: 0 }, { h: 2, error: 1e-30, knownError: 0 }, 4)).toEqual({ order: null, uncertainty: null });
  });
  it('throws where spacings do not rise', () => {
    expect(() => differenceOrder(difference(1, 2, 2), difference(2, 4, 2), 2)).toThrow('spacings must rise from fine to coarse, got 1, 2, 2');
  });
});

describe('judgeErrorSeries() of differences of consecutive solutions', () => {
  it('passes four grids of the formal order, with mixed ratios, over two orders of three grids each', () => {
    const judged = judgeErrorSeries(series([1, 1.5, 3, 5], 2));
    expect(judged).toMatchObject({ outcome: 'pass', reasons: ['in-band'], comparedTo: { label: 'g4', h: 5 }, fit: null });
    expect(judged.orders.map(({ fine, coarse, order }) => [fine, coarse, Number(order?.toFixed(9))])).toEqual([['g1', 'g2', 2], ['g2', 'g3', 2]]);
  });
  it('fails a lower order', () => {
    expect(judgeErrorSeries(series([1, 2, 4, 8, 16], 1))).toMatchObject({ outcome: 'fail', reasons: ['below-formal'] });
  });
  it('needs as many grids as an error series does', () => {
    expect(judgeErrorSeries(series([1, 2, 4], 2))).toMatchObject({ outcome: 'inconclusive', reasons: ['too-few-grids'] });
  });
  it('names a coarsest grid that is not coarser', () => {
    expect(() => judgeErrorSeries(series([1, 2, 4], 2, { comparedTo: { label: 'last', h: 2 } }))).toThrow('h of u (L2) on grid last must exceed that of the finer grid, got 2');
  });
});
