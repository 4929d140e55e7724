import { levenbergMarquardt } from '../fitting/levenberg-marquardt';
import { parameterSpread } from '../fitting/parameter-spread';
import { solveLeastSquares } from '../fitting/solve-least-squares';

export interface SpaceTimePoint { h: number; dt: number; error: number }
/** Members named as in the formula; each spread is null where the fit leaves none. */
export interface SpaceTimeFit {
  A: number; p: number; B: number; q: number; rho: number | null;
  /** Root of the mean squared residual, relative to the error. */
  residual: number;
  spread: { A: number; p: number; B: number; q: number; rho: number | null } | null;
}

/** Orders that the search starts from, in space and in time. */
const starts = [0.5, 1, 2, 3, 4] as const;
const orders = { lowest: 0.05, highest: 20 } as const;

/**
 * Orders in space and time from one matrix of grids and time steps. Norms: E² = A²h^2p + 2ρAB·h^pΔt^q + B²Δt^2q, since
 * norms of a sum are not sums of norms (without ρ a correct first-order code can fit q = 18), A, B > 0, fitted to ln E.
 * Signed errors of one value: E = Ah^p + BΔt^q, fitted to E relative to itself. Levenberg–Marquardt from 25 starts; the best is kept.
 *
 * At least three spacings, three time steps and one point more than parameters, and no error of 0: else null. A and B
 * hold for h and Δt in the units given.
 */
export function fitSpaceTime(points: readonly SpaceTimePoint[], isSigned: boolean): SpaceTimeFit | null {
  const counts = [new Set(points.map(({ h }) => h)).size, new Set(points.map(({ dt }) => dt)).size];
  const parameters = isSigned ? 4 : 5;
  if (Math.min(...counts) < 3 || points.length <= parameters || points.some(({ error }) => (isSigned ? error === 0 : !(error > 0)))) return null;
  const units = { h: geometricMean(points.map(({ h }) => h)), dt: geometricMean(points.map(({ dt }) => dt)), error: Math.max(...points.map(({ error }) => Math.abs(error))) };
  const scaled = points.map(({ h, dt, error }) => ({ h: h / units.h, dt: dt / units.dt, error: error / units.error }));
  const residuals = isSigned ? signedResiduals(scaled) : normResiduals(scaled);
  const found = starts.flatMap((p) => starts.map((q) => {
    const start = isSigned ? signedStart(scaled, p, q) : normStart(scaled, p, q);
    return levenbergMarquardt(residuals, start);
  })).reduce((best, each) => (each.sum < best.sum ? each : best));
  return Number.isFinite(found.sum) ? inUnits(found, { units, isSigned }) : null;
}

function geometricMean(values: readonly number[]): number {
  return Math.exp(values.reduce((sum, value) => sum + Math.log(value), 0) / values.length);
}

const isOrder = (order: number) => order >= orders.lowest && order <= orders.highest;

/** Parameters A, p, B, q. */
function signedResiduals(points: readonly SpaceTimePoint[]) {
  return ([A = 0, p = 0, B = 0, q = 0]: readonly number[]) => points.map(({ h, dt, error }) => (isOrder(p) && isOrder(q) ? (A * h ** p + B * dt ** q - error) / error : Infinity));
}

function signedStart(points: readonly SpaceTimePoint[], p: number, q: number): number[] {
  const [A = 1, B = 1] = solveLeastSquares(points.map(({ h, dt }) => [h ** p, dt ** q]), points.map(({ error }) => error), points.map(({ error }) => error ** -2)) ?? [];
  return [A, p, B, q];
}

/** Parameters ln A, p, ln B, q, and s with ρ = s/√(1 + s²), which keeps A and B above 0 and ρ within ±1. */
function normResiduals(points: readonly SpaceTimePoint[]) {
  return ([lnA = 0, p = 0, lnB = 0, q = 0, s = 0]: readonly number[]) => points.map(({ h, dt, error }) => {
    if (!isOrder(p) || !isOrder(q)) return Infinity;
    const [space, time] = [Math.exp(lnA) * h ** p, Math.exp(lnB) * dt ** q];
    return 0.5 * Math.log(space ** 2 + 2 * (s / Math.hypot(1, s)) * space * time + time ** 2) - Math.log(error);
  });
}

function normStart(points: readonly SpaceTimePoint[], p: number, q: number): number[] {
  const rows = points.map(({ h, dt }) => [h ** (2 * p), 2 * h ** p * dt ** q, dt ** (2 * q)]);
  const [aa = 1, ab = 0, bb = 1] = solveLeastSquares(rows, points.map(({ error }) => error ** 2), points.map(({ error }) => error ** -4)) ?? [];
  const [a, b] = [Math.sqrt(Math.max(aa, 1e-6)), Math.sqrt(Math.max(bb, 1e-6))];
  const rho = Math.min(0.9, Math.max(-0.9, ab / (a * b)));
  return [Math.log(a), p, Math.log(b), q, rho / Math.sqrt(1 - rho * rho)];
}

interface Scales { units: { h: number; dt: number; error: number }; isSigned: boolean }

function inUnits(found: ReturnType<typeof levenbergMarquardt>, { units, isSigned }: Scales): SpaceTimeFit {
  const [first = 0, p = 0, second = 0, q = 0, s = 0] = found.parameters;
  const [a, b] = isSigned ? [first, second] : [Math.exp(first), Math.exp(second)];
  const [toA, toB] = [units.error / units.h ** p, units.error / units.dt ** q];
  const spread = parameterSpread(found.jacobian, found.sum);
  const [ofA = 0, ofP = 0, ofB = 0, ofQ = 0, ofS = 0] = spread ?? [];
  return {
    A: a * toA, p, B: b * toB, q, rho: isSigned ? null : s / Math.hypot(1, s),
    residual: Math.sqrt(found.sum / found.jacobian.length),
    spread: spread && {
      A: (isSigned ? ofA : a * ofA) * toA, p: ofP, B: (isSigned ? ofB : b * ofB) * toB, q: ofQ, rho: isSigned ? null : ofS / Math.hypot(1, s) ** 3,
    },
  };
}
