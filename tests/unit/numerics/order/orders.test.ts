import { describe, expect, it } from 'vitest';
import { gridTriple } from '@/lib/numerics/order/grid-triple';
import { halfUnits } from '@/lib/numerics/order/half-units';
import { leastSquaresOrder } from '@/lib/numerics/order/least-squares-order';
import { orderRange } from '@/lib/numerics/order/order-range';
import { oscillatingFormula } from '@/lib/numerics/order/oscillating-formula';
import { pairwiseOrder } from '@/lib/numerics/order/pairwise-order';
import { printedResolution } from '@/lib/numerics/order/printed-resolution';
import { studentT } from '@/lib/numerics/order/student-t';
import { threeGridOrder } from '@/lib/numerics/order/three-grid-order';

describe('pairwiseOrder(coarse, fine)', () => {
  const at = (h: number, error: number, knownError = 0) => ({ h, error, knownError });
  it('is 2 when the error quarters', () => expect(pairwiseOrder(at(0.2, 4), at(0.1, 1))).toEqual({ order: 2, uncertainty: 0 }));
  it('is negative when the error grows', () => expect(pairwiseOrder(at(0.2, 1), at(0.1, 2)).order).toBeCloseTo(-1, 12));
  it('carries known errors as (δc/Ec + δf/Ef)/ln r', () => {
    expect(pairwiseOrder(at(0.2, 4, 0.04), at(0.1, 1, 0.02)).uncertainty).toBeCloseTo(0.03 / Math.log(2), 12);
  });
  it('stays finite where the quotient of two errors is beyond a double', () => {
    expect(pairwiseOrder(at(0.2, 1e300), at(0.1, 1e-300)).order).toBeCloseTo(600 * Math.log2(10), 9);
    expect(pairwiseOrder(at(0.2, 1e-300), at(0.1, 1e300)).order).toBeCloseTo(-600 * Math.log2(10), 9);
    expect(pairwiseOrder(at(0.2, 1e-300, 1e20), at(0.1, 1)).uncertainty).toBe(Number.MAX_VALUE);
  });
  it('is null where an error is 0', () => expect(pairwiseOrder(at(0.2, 4), at(0.1, 0))).toEqual({ order: null, uncertainty: null }));
  it('throws where the coarse spacing is not the larger', () => expect(() => pairwiseOrder(at(0.1, 4), at(0.2, 1))).toThrow('coarse.h must exceed fine.h, got 0.1 and 0.2'));
});

describe('threeGridOrder(triple)', () => {
  const triple = (order: number, h: readonly [number, number, number]) => {
    const [fine, middle, coarse] = h.map((spacing) => ({ h: spacing, value: 1 + 0.3 * spacing ** order })) as [{ h: number; value: number }, { h: number; value: number }, { h: number; value: number }];
    return gridTriple(fine, middle, coarse);
  };
  it.each([[2, [1, 2, 4]], [1.37, [1, 1.5, 2]], [4, [0.1, 0.15, 0.3]], [-1.1, [1, 2, 4]], [-0.5, [1, 1.4, 3]], [0.01, [1, 2, 3]]] as const)('recovers order %d on spacings %j', (order, h) => {
    expect(threeGridOrder(triple(order, h)).order).toBeCloseTo(order, 8);
  });
  it('is 0 at the limit ε21/ε32 = ln r21/ln r32 for unequal ratios', () => {
    expect(threeGridOrder({ e21: Math.log(1.5), e32: Math.log(3), r21: 1.5, r32: 3 }).order).toBeCloseTo(0, 9);
  });
  it('is null where the values oscillate or do not change', () => {
    expect(threeGridOrder({ e21: 1, e32: -2, r21: 2, r32: 2 })).toEqual({ order: null, reason: 'not-monotone' });
    expect(threeGridOrder({ e21: 0, e32: -2, r21: 2, r32: 2 })).toEqual({ order: null, reason: 'not-monotone' });
    expect(threeGridOrder({ e21: 1, e32: 0, r21: 2, r32: 2 })).toEqual({ order: null, reason: 'not-monotone' });
  });
  it('is null outside [−10, 20]', () => {
    expect(threeGridOrder({ e21: 1, e32: 2 ** 21, r21: 2, r32: 2 })).toEqual({ order: null, reason: 'order-out-of-range' });
    expect(threeGridOrder({ e21: 2 ** 11, e32: 1, r21: 2, r32: 2 })).toEqual({ order: null, reason: 'order-out-of-range' });
  });
});

describe('oscillatingFormula(triple)', () => {
  it('is ln|ε32/ε21|/ln r for a constant ratio', () => expect(oscillatingFormula({ e21: 1, e32: -4, r21: 2, r32: 2 })).toBeCloseTo(2, 12));
  it('is null where the values do not oscillate', () => {
    expect(oscillatingFormula({ e21: 1, e32: 4, r21: 2, r32: 2 })).toBeNull();
    expect(oscillatingFormula({ e21: 1, e32: 0, r21: 2, r32: 2 })).toBeNull();
  });
});

describe('leastSquaresOrder(grids)', () => {
  const grids = (h: number[], errors: number[]) => h.map((spacing, i) => ({ h: spacing, error: errors[i] ?? 0 }));
  it('is the slope, without spread on exact powers', () => {
    const fit = leastSquaresOrder(grids([1, 0.5, 0.25, 0.1], [1, 0.25, 0.0625, 0.01]));
    expect(fit?.order).toBeCloseTo(2, 12);
    expect(fit?.low).toBeCloseTo(2, 9);
    expect(fit?.high).toBeCloseTo(2, 9);
  });
  it('has a spread of Student t times the standard error of the slope', () => {
    // ln h = 0, 1, 2, 3 and ln E = 0, 2, 4, 7: slope 2.3, residuals 0.2, −0.1, −0.4, 0.3, standard error √(0.3/2/5).
    const fit = leastSquaresOrder(grids([0, 1, 2, 3].map(Math.exp), [0, 2, 4, 7].map(Math.exp)));
    expect(fit?.order).toBeCloseTo(2.3, 12);
    expect((fit?.high ?? 0) - 2.3).toBeCloseTo(studentT(0.975, 2) * Math.sqrt(0.3 / 2 / 5), 10);
  });
  it('has no spread with three grids, and is null with one or with an error of 0', () => {
    expect(leastSquaresOrder(grids([1, 0.5, 0.25], [4, 1, 0.2]))).toMatchObject({ low: null, high: null });
    expect(leastSquaresOrder(grids([1], [1]))).toBeNull();
    expect(leastSquaresOrder(grids([1, 0.5], [1, 0]))).toBeNull();
    expect(leastSquaresOrder(grids([1, 1], [1, 2]))).toBeNull();
  });
});

describe('printedResolution(values)', () => {
  it.each([[[313.456, 337.54], 0.001], [[295, 300], 1], [[1.752e-3, 1e-7], 1e-7], [[1.5e21, 3], 1], [[], 1], [[-0.25, 0], 0.01]])('of %j is %d', (values, unit) => {
    expect(printedResolution(values)).toBe(unit);
  });
  it('throws for a value that is not finite', () => expect(() => printedResolution([Number.NaN])).toThrow('values must be finite, got NaN'));
  it('gives half units, or half of what is stated', () => {
    expect(halfUnits([{ value: 1.25, resolution: null }, { value: 1.5, resolution: 0.1 }])).toEqual([0.005, 0.05]);
  });
});

describe('orderRange(fine, middle, coarse)', () => {
  it('is the interval that half a unit of each value leaves', () => {
    const range = orderRange({ h: 1, value: 1.01, halfUnit: 0.005 }, { h: 2, value: 1.04, halfUnit: 0.005 }, { h: 4, value: 1.16, halfUnit: 0.005 });
    expect(range?.[0]).toBeCloseTo(Math.log2(0.11 / 0.04), 9);
    expect(range?.[1]).toBeCloseTo(Math.log2(0.13 / 0.02), 9);
  });
  it('is null where the digits leave a change of sign open', () => {
    expect(orderRange({ h: 1, value: 1.01, halfUnit: 0.01 }, { h: 2, value: 1.02, halfUnit: 0.01 }, { h: 4, value: 1.16, halfUnit: 0.01 })).toBeNull();
  });
});

it('gridTriple(fine, middle, coarse) throws where spacings do not rise', () => {
  expect(() => gridTriple({ h: 2, value: 1 }, { h: 1, value: 1 }, { h: 3, value: 1 })).toThrow('spacings must rise from fine to coarse, got 2, 1, 3');
});
