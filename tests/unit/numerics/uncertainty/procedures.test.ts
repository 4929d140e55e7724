import { describe, expect, it } from 'vitest';
import type { Procedure } from '@/lib/numerics/assessment';
import { solveLeastSquares } from '@/lib/numerics/fitting/solve-least-squares';
import { judgeQuantity } from '@/lib/numerics/outcome/judge-quantity';
import { correctionFactor } from '@/lib/numerics/uncertainty/correction-factor';
import { guardedOrder } from '@/lib/numerics/uncertainty/guarded-order';
import { numericalUncertainty } from '@/lib/numerics/uncertainty/numerical-uncertainty';
import { quantitySeries } from '../../../support/series';

const h = [1, 2, 4, 8, 16];
const power = (p: number, alpha = 0.1) => h.map((spacing) => 10 + alpha * spacing ** p);
const judge = (procedure: Procedure, values: readonly number[], changes = {}) => judgeQuantity(quantitySeries(h.slice(0, values.length), values, { procedure, formalOrder: 2, ...changes }));

describe('solveLeastSquares(rows, right, weights)', () => {
  it('finds the line through weighted points', () => {
    const [a, b] = solveLeastSquares([[1, 0], [1, 1], [1, 2]], [1, 3, 5.5], [1, 1, 0]) ?? [];
    expect(a).toBeCloseTo(1, 14);
    expect(b).toBeCloseTo(2, 14);
  });
  it('is null where columns depend on each other, and with too few rows', () => {
    expect(solveLeastSquares([[1, 2], [2, 4], [3, 6]], [1, 2, 3])).toBeNull();
    expect(solveLeastSquares([[1, 2]], [1])).toBeNull();
  });
});

describe('guardedOrder(observed, formal)', () => {
  it.each([
    [2.2, { order: 2, safetyFactor: 1.25, branch: 'near-formal' }], [1.8, { order: 2, safetyFactor: 1.25, branch: 'near-formal' }],
    [1.79, { order: 1.79, safetyFactor: 3, branch: 'off-formal' }], [3.5, { order: 2, safetyFactor: 3, branch: 'off-formal' }],
    [0.2, { order: 0.5, safetyFactor: 3, branch: 'off-formal' }], [-1, { order: 0.5, safetyFactor: 3, branch: 'order-undefined' }],
    [null, { order: 0.5, safetyFactor: 3, branch: 'order-undefined' }],
  ])('of %s against 2', (observed, expected) => expect(guardedOrder(observed, 2)).toEqual(expected));
  it('throws for a formal order of 0', () => expect(() => guardedOrder(1, 0)).toThrow('formalOrder must be above 0, got 0'));
});

describe('correctionFactor(grids, order, formal order)', () => {
  const [fine, middle] = [{ h: 1, value: 10 }, { h: 2, value: 10.3 }];
  it('is 1 with a multiplier of 1.1 at the formal order', () => {
    const found = correctionFactor({ fine, middle }, 2, 2);
    expect(found).toMatchObject({ correctionFactor: 1, multiplier: 1.1, branch: 'near-asymptotic' });
    expect(found.uncertainty).toBeCloseTo(0.11, 12);
  });
  it('meets between its branches at |1 − C| = 0.125 with 1.25', () => {
    const at = (factor: number) => correctionFactor({ fine, middle }, Math.log2(1 + 3 * factor), 2).multiplier;
    expect(at(1.1249999)).toBeCloseTo(1.25, 5);
    expect(at(0.875)).toBeCloseTo(1.25, 5);
    expect(at(0.5)).toBeCloseTo(2, 12);
  });
  it('throws for an order of 0', () => expect(() => correctionFactor({ fine, middle }, 0, 2)).toThrow('order must be above 0, got 0'));
});

describe('numericalUncertainty(band, parts)', () => {
  it('adds its parts in quadrature', () => {
    expect(numericalUncertainty(6, { factor: 2, iterative: 4, time: 0 })).toBe(5);
    expect(numericalUncertainty(0, { factor: 2, iterative: 3, time: 4 })).toBe(5);
    expect(numericalUncertainty(null, { factor: 2, iterative: 3, time: 4 })).toBeNull();
    expect(() => numericalUncertainty(1, { factor: 0, iterative: 0, time: 0 })).toThrow('factor must be above 0, got 0');
  });
});

describe('judgeQuantity by other procedures', () => {
  it('guarded order takes the formal one near it and has a band where values oscillate', () => {
    expect(judge('guarded-order', power(2.1))).toMatchObject({ branch: 'near-formal', orderUsed: 2, safetyFactor: 1.25, constants: { agreement: 0.1 } });
    const oscillating = judge('guarded-order', [10.1, 10.4, 10]);
    expect(oscillating).toMatchObject({ branch: 'order-undefined', orderObserved: null, orderUsed: 0.5, safetyFactor: 3, extrapolated: null });
    expect(oscillating.gciAbsolute).toBeCloseTo((3 * 0.3) / (Math.SQRT2 - 1), 9);
    expect(oscillating.halfRange).toBeCloseTo(0.2, 12);
  });
  it('correction factor gives U and no GCI, and judges by it', () => {
    const found = judge('correction-factor', power(2, 0.01), { target: 0.01 });
    expect(found).toMatchObject({ branch: 'near-asymptotic', gci: null, outcome: 'meets-target' });
    expect(found.uncertainty).toBeCloseTo(0.011, 9);
    expect(judge('correction-factor', power(2, 0.01), { target: 0.001 }).outcome).toBe('misses-target');
  });
  it('need a formal order', () => {
    for (const procedure of ['guarded-order', 'correction-factor'] as const) expect(judge(procedure, power(2), { formalOrder: null })).toMatchObject({ branch: 'none', gci: null, uncertainty: null });
  });
  it('least squares recovers φ0 + αh^p and takes other forms outside 0.5 ≤ p ≤ 2', () => {
    const found = judge('least-squares', power(1.5));
    expect(found.branch).toBe('power');
    expect(found.orderObserved).toBeCloseTo(1.5, 6);
    expect(found.extrapolated).toBeCloseTo(10, 6);
    expect(judge('least-squares', power(3))).toMatchObject({ branch: 'second-term', orderUsed: 2, safetyFactor: 3 });
    expect(judge('least-squares', power(2.05))).toMatchObject({ branch: 'second-term', safetyFactor: 1.25 });
    expect(['first-term', 'second-term', 'two-terms']).toContain(judge('least-squares', power(0.2)).branch);
    expect(judge('least-squares', h.map((spacing) => 10 + 0.3 * spacing - 0.02 * spacing ** 2)).fit?.kind).toBe('two-terms');
  });
  it('least squares inflates U where values scatter, tells a hit on a bound, and needs four grids', () => {
    const scattered = judge('least-squares', [10, 10.2, 9.9, 10.3, 10.1]);
    expect(scattered.safetyFactor).toBe(3);
    expect(scattered.fit?.sigma).toBeGreaterThan(scattered.fit?.dataRange ?? Infinity);
    expect(judge('least-squares', [10, 10, 10, 10, 11])).toMatchObject({ orderObserved: null, fit: { atBound: 'highest' } });
    expect(judge('least-squares', power(2).slice(0, 3))).toMatchObject({ branch: 'none', uncertainty: null });
    expect(judge('least-squares', [1, 1, 1, 1])).toMatchObject({ branch: 'none', fit: null });
  });
  it('two grids assume the formal order whatever the procedure', () => {
    for (const procedure of ['guarded-order', 'least-squares', 'correction-factor'] as const) expect(judge(procedure, power(2).slice(0, 2))).toMatchObject({ branch: 'formal-two-grids', safetyFactor: 3 });
  });
  it('u_num takes the parts of the finest grid', () => {
    const grids = power(2).map((value, i) => ({ label: `g${i}`, h: h[i] ?? 0, value, resolution: null, iterativeError: i === 0 ? 3 : 100, timeError: i === 0 ? 4 : 100 }));
    const found = judge('three-grid', power(2), { grids, uNumFactor: 1.15 });
    expect(found.uNum).toBeCloseTo(Math.hypot((found.gciAbsolute ?? 0) / 1.15, 5), 9);
    expect(judge('three-grid', power(2)).uNum).toBeUndefined();
  });
});
