import { describe, expect, it } from 'vitest';
import { runInsulatedWall } from '@/fixtures/solvers/insulated-wall';
import { assessSeries } from '@/lib/numerics/assess-series';
import type { FieldAssessment } from '@/lib/numerics/assessment';
import { errorSeries } from '../support/series';

const halvings = (from: number, count: number) => Array.from({ length: count }, (_, i) => from / 2 ** i);

function assess(h: readonly number[], errors: readonly number[], changes: Parameters<typeof errorSeries>[2] = {}): FieldAssessment {
  const [field] = assessSeries({ errors: [errorSeries(h, errors.map(Math.abs), changes)], quantities: [] }).fields;
  if (!field) throw new Error('Nothing was assessed.');
  return field;
}
const lastOrder = ({ orders }: FieldAssessment) => orders[0]?.order ?? NaN;

/** The derivative of sin at 1 by differences. */
const formulas = {
  forward: (h: number) => (Math.sin(1 + h) - Math.sin(1)) / h,
  backward: (h: number) => (Math.sin(1) - Math.sin(1 - h)) / h,
  central: (h: number) => (Math.sin(1 + h) - Math.sin(1 - h)) / (2 * h),
  biased: (h: number) => (2 * Math.sin(1 + h) + 3 * Math.sin(1) - 6 * Math.sin(1 - h) + Math.sin(1 - 2 * h)) / (6 * h),
};

// R. J. LeVeque, Finite Difference Methods for Ordinary and Partial Differential Equations, SIAM 2007, table 1.1.
const published: [keyof typeof formulas, number, number, number][] = [
  ['forward', 1, -4.2939e-2, -4.2163e-3], ['central', 2, -9.0005e-4, -9.0050e-6], ['biased', 3, 6.8207e-5, 6.9941e-8],
];

describe('the derivative of sin at 1', () => {
  it.each(published)('by the %s difference has order %d and the published errors', (name, order, coarse, fine) => {
    const error = (h: number) => formulas[name](h) - Math.cos(1);
    expect(error(0.1).toPrecision(5)).toBe(coarse.toPrecision(5));
    expect(error(0.01).toPrecision(5)).toBe(fine.toPrecision(5));
    const h = halvings(0.05, 5);
    const judged = assess(h, h.map(error), { formalOrder: order });
    expect([judged.outcome, Math.round(lastOrder(judged) * 10) / 10]).toEqual(['pass', order]);
  });
  it('by the backward difference has order 1, and fails a claim of 2', () => {
    const h = halvings(0.05, 5);
    expect(assess(h, h.map((step) => formulas.backward(step) - Math.cos(1)))).toMatchObject({ outcome: 'fail', reasons: ['below-formal'] });
  });
});

describe('the central difference of exp(−t) at 1/2', () => {
  const error = (h: number) => (Math.exp(-0.5 - h) - Math.exp(-0.5 + h)) / (2 * h) + Math.exp(-0.5);
  // Common practice; the figures were found so in double precision and depend on the last bits of exp.
  it.each([[20, 3e-12], [24, 1.2e-10], [28, 6.6e-9]])('errs at h = 2^−%d by about %d, which is round-off', (power, size) => {
    expect(Math.abs(error(2 ** -power)) / size).toBeGreaterThan(0.2);
    expect(Math.abs(error(2 ** -power)) / size).toBeLessThan(5);
  });
  it('passes while truncation shows; where round-off does it fails, unless the known error says why', () => {
    const above = halvings(2 ** -3, 6);
    expect(assess(above, above.map(error)).outcome).toBe('pass');
    const below = halvings(2 ** -18, 6);
    expect(assess(below, below.map(error)).outcome).toBe('fail');
    expect(assess(below, below.map(error), { knownErrors: below.map((h) => 2 ** -53 / h) })).toMatchObject({ outcome: 'inconclusive', reasons: ['too-few-grids'] });
  });
});

describe('advection of a step by the first-order upwind scheme', () => {
  const [courant, time] = [0.5, 0.25];
  /** L1 error over the domain, of cell values, for a step carried from x = 1/4 to 1/2. */
  const error = (h: number) => {
    const cells = Math.round(1 / h);
    const exact = (at: number, t: number): number => ((at + 0.5) * h < 0.25 + t ? 1 : 0);
    let u: number[] = Array.from({ length: cells }, (_, i) => exact(i, 0));
    for (let step = 0; step < Math.round(time / (courant * h)); step += 1) u = u.map((value, i) => value - courant * (value - (u[i - 1] ?? 1)));
    return u.reduce((sum, value, i) => sum + h * Math.abs(value - exact(i, time)), 0);
  };
  it('has order 1/2 in L1 and tends to √(2Th(1 − c)/π)', () => {
    const h = halvings(1 / 256, 4);
    const judged = assess(h, h.map(error), { norm: 'L1', formalOrder: 0.5 });
    expect(lastOrder(judged)).toBeCloseTo(0.5, 2);
    expect(error(1 / 2048) / Math.sqrt((2 * time * (1 - courant)) / (2048 * Math.PI))).toBeCloseTo(1, 2);
  });
});

describe('conduction in a wall with a given gradient', () => {
  // Common practice: a Neumann closure of first order takes the whole solution of a second-order equation with it.
  it.each([['one-sided', 1], ['balance', 2]] as const)('has with the %s closure order %d', (closure, order) => {
    const h = halvings(1 / 16, 5);
    const errors = h.map((spacing) => {
      const rows = runInsulatedWall(Math.round(1 / spacing), closure).trim().split('\n').slice(1).map((row) => row.split(',').map(Number));
      return Math.sqrt(rows.reduce((sum, [x = 0, length = 0, value = 0]) => sum + length * (value - 20 - 60 * Math.cos((Math.PI * x) / 2)) ** 2, 0));
    });
    expect(lastOrder(assess(h, errors))).toBeCloseTo(order, 1);
    expect(assess(h, errors).outcome).toBe(order === 2 ? 'pass' : 'fail');
  });
});
