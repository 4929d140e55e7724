import { describe, expect, it } from 'vitest';
import { explainOrderSource } from '@/lib/domain/assessment/explain-order-source';
import { judgeErrorSeries } from '@/lib/numerics/outcome/judge-error-series';
import { logPart } from '@/lib/numerics/outcome/log-corrected';
import { regularOrder } from '@/lib/numerics/outcome/regular-order';
import { errorSeries } from '../../../support/series';

const h = [1 / 4, 1 / 8, 1 / 16, 1 / 32, 1 / 64];

describe('regularOrder(norm, formal order, regularity)', () => {
  // Re-entrant corner, u ~ r^(2/3): energy norm 2/3, L2 4/3 (Strang and Fix 1973).
  it.each([['energy', 1, 2 / 3], ['H1', 1, 2 / 3], ['L2', 2, 4 / 3], ['L1', 2, 4 / 3], ['Linf', 2, 2 / 3], ['value', 2, 4 / 3]] as const)('%s of order %d at the corner of u ~ r^(2/3) is %d', (norm, formal, left) => {
    expect(regularOrder(norm, formal, 2 / 3)).toBeCloseTo(left, 14);
  });
  it('leaves the formal order where the solution is smooth enough', () => expect(regularOrder('L2', 3, 2)).toBe(3));
  it('throws for a regularity of 0', () => expect(() => regularOrder('L2', 2, 0)).toThrow('regularity must be above 0, got 0'));
});

describe('logPart(h, log factor)', () => {
  it('is |ln(h/L)|^k', () => {
    expect(logPart(0.5, { power: 2, length: 0.5 * Math.E })).toBeCloseTo(1, 14);
    expect(logPart(0.1, { power: 1, length: 1 })).toBeCloseTo(Math.log(10), 14);
  });
  it('throws where h is not below the length', () => expect(() => logPart(1, { power: 1, length: 1 })).toThrow('h must be below the length 1 of the domain for a log factor, got 1'));
});

describe('judgeErrorSeries with what the case declares of its order', () => {
  it('judges the order that the regularity leaves and tells both', () => {
    const found = judgeErrorSeries(errorSeries(h, h.map((spacing) => spacing ** (4 / 3)), { regularity: 2 / 3 }));
    expect(found).toMatchObject({ outcome: 'pass', statedOrder: 2, regularity: 2 / 3 });
    expect(found.formalOrder).toBeCloseTo(4 / 3, 14);
    expect(explainOrderSource(found)[0]).toContain('of the stated 2');
    expect(judgeErrorSeries(errorSeries(h, h.map((spacing) => spacing ** 2), { regularity: 3 })).statedOrder).toBeUndefined();
  });
  it('reads orders from the error without its logarithm', () => {
    const errors = h.map((spacing) => 3 * spacing ** 2 * Math.abs(Math.log(spacing)));
    const plain = judgeErrorSeries(errorSeries(h, errors));
    const found = judgeErrorSeries(errorSeries(h, errors, { logFactor: { power: 1, length: 1 } }));
    expect(plain.outcome).not.toBe('pass');
    expect(found).toMatchObject({ outcome: 'pass', logFactor: 1 });
    for (const { order } of found.orders) expect(order).toBeCloseTo(2, 12);
    expect(found.grids.map((grid) => grid.error)).toEqual(errors.toReversed());
    expect(found.grids[0]?.correctedError).toBeCloseTo(3 / 64 ** 2, 14);
  });
  it('keeps the known error in proportion', () => {
    const errors = h.map((spacing) => spacing ** 2 * Math.abs(Math.log(spacing)));
    const known = errors.map((error) => error / 100);
    const [pair] = judgeErrorSeries(errorSeries(h, errors, { knownErrors: known, logFactor: { power: 1, length: 1 } })).orders;
    expect(pair?.uncertainty).toBeCloseTo(0.02 / Math.LN2, 9);
  });
  it('shows a part of the domain and does not judge it', () => {
    expect(judgeErrorSeries(errorSeries(h, h.map((spacing) => spacing ** 2), { region: 'interior-2h' }))).toMatchObject({ region: 'interior-2h', outcome: null, reasons: [] });
  });
});
