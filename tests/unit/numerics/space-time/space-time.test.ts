import { describe, expect, it } from 'vitest';
import { explainTimeSteps } from '@/lib/domain/assessment/explain-time-steps';
import { stateSpaceTime } from '@/lib/domain/assessment/state-space-time';
import { plannedRefinement } from '@/lib/domain/cases/planned-refinement';
import { checkSpaceTime } from '@/lib/domain/studies/check-space-time';
import { levenbergMarquardt } from '@/lib/numerics/fitting/levenberg-marquardt';
import { parameterSpread } from '@/lib/numerics/fitting/parameter-spread';
import { assessSpaceTime } from '@/lib/numerics/space-time/assess-space-time';
import { timeStepFamily } from '@/lib/numerics/spacing/time-step-family';

const matrix = [0.1, 0.05, 0.025].flatMap((h) => [0.1, 0.05, 0.025].map((dt) => ({ label: `${h} ${dt}`, h, dt })));
const withNorms = matrix.map((point) => ({ ...point, error: Math.sqrt((2 * point.h ** 2) ** 2 + 2 * 0.3 * 2 * point.h ** 2 * 0.5 * point.dt + (0.5 * point.dt) ** 2) }));

describe('assessSpaceTime(series)', () => {
  it('recovers A, p, B, q and ρ of norms, and which part is larger', () => {
    const found = assessSpaceTime({ field: 'u', norm: 'L2', isSigned: false, formalOrder: 2, points: withNorms });
    expect(found.A).toBeCloseTo(2, 4);
    expect(found.p).toBeCloseTo(2, 5);
    expect(found.B).toBeCloseTo(0.5, 5);
    expect(found.q).toBeCloseTo(1, 5);
    expect(found.rho).toBeCloseTo(0.3, 4);
    expect(found.points[0]).toMatchObject({ h: 0.025, dt: 0.025 });
    expect(found.points[0]?.time).toBeGreaterThan(found.points[0]?.space ?? Infinity);
    expect(stateSpaceTime([found])).toMatch(/^Fitted over all grids and time steps, the L2 error of u falls with order 2\.00.* in space and order 1\.00.* in time; .* the time step has the larger part\.$/);
  });
  it('gives the same to the last bit in any order of points and units', () => {
    const points = withNorms.map(({ label, h, dt, error }) => ({ label, h: h * 4, dt: dt / 8, error: error * 2 }));
    const found = assessSpaceTime({ field: 'u', norm: 'L2', isSigned: false, formalOrder: 2, points });
    expect(found.p).toBeCloseTo(2, 5);
    expect(found.q).toBeCloseTo(1, 5);
  });
  it.each([['two spacings', withNorms.filter(({ h }) => h < 0.1)], ['an error of 0', withNorms.map((point, i) => (i === 0 ? { ...point, error: 0 } : point))], ['no points', []]])('has no fit for %s', (_, points) => {
    expect(assessSpaceTime({ field: 'u', norm: 'L2', isSigned: false, formalOrder: null, points })).toMatchObject({ A: null, p: null, q: null, rho: null, spread: null });
  });
});

describe('levenbergMarquardt(residuals, start)', () => {
  it('finds the minimum of Rosenbrock’s valley', () => {
    const found = levenbergMarquardt(([x = 0, y = 0]) => [10 * (y - x * x), 1 - x], [-1.2, 1]);
    expect(found.parameters[0]).toBeCloseTo(1, 8);
    expect(found.parameters[1]).toBeCloseTo(1, 8);
  });
});

describe('parameterSpread(jacobian, sum)', () => {
  it('is t·s/√Σ(x−x̄)² for the slope of a line', () => {
    const x = [0, 1, 2, 3];
    expect(parameterSpread(x.map((value) => [1, value]), 0.2)?.[1]).toBeCloseTo((4.302652729911275 * Math.sqrt(0.1)) / Math.sqrt(5), 9);
    expect(parameterSpread([[1, 2], [3, 4]], 1)).toBeNull();
    expect(parameterSpread([[1, 2], [2, 4], [3, 6]], 1)).toBeNull();
  });
});

describe('timeStepFamily(grids)', () => {
  const of = (step: (h: number) => number) => timeStepFamily([0.1, 0.05, 0.025].map((h) => ({ h, dt: step(h) })));
  it('tells held, bound and free steps apart', () => {
    expect(of(() => 0.01)).toEqual({ kind: 'fixed' });
    expect(of((h) => h * h)).toMatchObject({ kind: 'power', exponent: expect.closeTo(2, 9) as number });
    expect(of((h) => (h === 0.05 ? 1 : h))).toEqual({ kind: 'free' });
    expect(timeStepFamily([{ h: 1, dt: 1 }])).toBeNull();
    expect(explainTimeSteps([0.1, 0.05].map((h) => ({ h, dt: h * h })))).toContain('to the power 2: an order q in time shows as 2 q');
  });
});

describe('checkSpaceTime(grids)', () => {
  const around = { dimension: 1, volume: null };
  const faults = (grids: object[]) => checkSpaceTime(grids.map((grid, i) => ({ label: `g${i}`, ...grid })), around).map(({ message }) => message);
  it('takes a full matrix of 3 × 3 and tells what is missing', () => {
    expect(faults(matrix.map(({ h, dt }) => ({ h, dt })))).toEqual([]);
    expect(faults(matrix.slice(0, 6).map(({ h, dt }) => ({ h, dt })))[0]).toContain('Found 2 spacings and 3 time steps');
    expect(faults(matrix.slice(0, 8).map(({ h, dt }) => ({ h, dt })))[0]).toContain('Expected all 9');
    expect(faults([...matrix, ...matrix.slice(0, 1)].map(({ h, dt }) => ({ h, dt })))[0]).toContain('the same spacing and time step');
  });
  it('a plan says how it refines', () => {
    expect(plannedRefinement(matrix)).toBe('space-time');
    expect(plannedRefinement([{ label: 'a', dt: 1 }, { label: 'b', dt: 2 }])).toBe('time');
    expect(plannedRefinement([{ label: 'a', h: 1, dt: 1 }, { label: 'b', h: 2, dt: 2 }])).toBe('space');
    expect(plannedRefinement([])).toBe('space');
  });
});
