import { describe, expect, it } from 'vitest';
import { fitSpaceTime } from '@/lib/numerics/space-time/fit-space-time';
import { judgeErrorSeries } from '@/lib/numerics/outcome/judge-error-series';
import { errorSeries } from '../support/series';
import { readReference } from './reference';

interface Matrix { formal: { p: number; q: number }; errors: [number, number, number][]; fit: { A: number; p: number; B: number; q: number } }
interface Families { backwardEulerDtLikeDx: number[]; backwardEulerDtLikeDx2: number[]; spaceOnlyWithFixedDt: number[]; forwardEulerRatioOneSixth: number[] }
const { backwardEuler, crankNicolson, theory, oneParameter } = readReference<{
  backwardEuler: Matrix; crankNicolson: Matrix; oneParameter: Families;
  theory: { spaceCoefficient: number; timeBackwardEuler: number; timeCrankNicolson: number };
}>('space-time.json');

const end = 0.1;
const pointsOf = ({ errors }: Matrix) => errors.map(([n, steps, error]) => ({ h: 1 / n, dt: end / steps, error }));

/** The exact error of the θ scheme for the heat equation, u = sin(πx)exp(−π²t), at x = ½ and t = 0.1. */
function thetaError(n: number, steps: number, theta: 0 | 1): number {
  const s = 4 * (end / steps) * n * n * Math.sin(Math.PI / (2 * n)) ** 2;
  return (theta === 1 ? 1 / (1 + s) : 1 - s) ** steps - Math.exp(-(Math.PI ** 2) * end);
}

const ordersOf = (pairs: readonly (readonly [number, number])[], theta: 0 | 1) => {
  const series = errorSeries(pairs.map(([n]) => 1 / n), pairs.map(([n, steps]) => Math.abs(thetaError(n, steps, theta))));
  return judgeErrorSeries(series).orders.map(({ order }) => order ?? Number.NaN).reverse();
};

// Closed form of the discrete solution (common practice); fits recomputed with scipy.
describe('θ schemes for the heat equation on matrices of grid and time step', () => {
  it('the errors are those of the closed form', () => {
    for (const [n, steps, error] of backwardEuler.errors) expect(thetaError(n, steps, 1) / error).toBeCloseTo(1, 9);
  });

  it.each([['backward Euler', backwardEuler, theory.timeBackwardEuler], ['Crank–Nicolson', crankNicolson, theory.timeCrankNicolson]] as const)('%s, signed', (_, matrix, timeCoefficient) => {
    const found = fitSpaceTime(pointsOf(matrix), true);
    expect(found?.rho).toBeNull();
    for (const name of ['A', 'p', 'B', 'q'] as const) expect((found?.[name] ?? Number.NaN) / matrix.fit[name]).toBeCloseTo(1, 5);
    expect(Math.abs((found?.p ?? 0) - matrix.formal.p)).toBeLessThan(0.05);
    expect(Math.abs((found?.q ?? 0) - matrix.formal.q)).toBeLessThan(0.05);
    expect(Math.abs((found?.B ?? 0) / timeCoefficient - 1)).toBeLessThan(0.2);
  });

  it('Crank–Nicolson without signs: ρ finds that the parts cancel', () => {
    const found = fitSpaceTime(pointsOf(crankNicolson).map((point) => ({ ...point, error: Math.abs(point.error) })), false);
    expect(found?.rho).toBeLessThan(-0.99);
    expect(found?.p).toBeCloseTo(2, 1);
    expect(found?.q).toBeCloseTo(2, 1);
  });

  it('one-parameter families and the two traps', () => {
    const close = (found: number[], expected: number[]) => {
      expect(found.length).toBeGreaterThanOrEqual(expected.length);
      expected.forEach((order, i) => expect(found[i]).toBeCloseTo(order, 4));
    };
    close(ordersOf([10, 20, 40, 80, 160].map((n) => [n, n]), 1), oneParameter.backwardEulerDtLikeDx);
    close(ordersOf([10, 20, 40, 80].map((n) => [n, (n * n) / 10]), 1), oneParameter.backwardEulerDtLikeDx2);
    close(ordersOf([10, 20, 40, 80].map((n) => [n, 0.6 * n * n]), 0), oneParameter.forwardEulerRatioOneSixth);
    expect(oneParameter.spaceOnlyWithFixedDt.every((order, i, all) => i === 0 || order < (all[i - 1] ?? 0))).toBe(true);
  });
});
