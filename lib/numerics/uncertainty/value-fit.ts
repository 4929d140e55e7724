import type { ValueFit } from '../assessment';
import { solveLeastSquares } from '../fitting/solve-least-squares';

interface GridValue { h: number; value: number }
export type FittedValues = Omit<ValueFit, 'uncertainty' | 'dataRange'> & { fitted: number[] };

/** The exponents of each form without an order of its own. */
const exponents = { 'first-term': [1], 'second-term': [2], 'two-terms': [1, 2] } as const;

/** Orders looked at: beyond them a fitted order is no order of any scheme, and a fit that ends at one is reported. */
export const searchBounds = { lowest: -2, highest: 10 } as const;
const scanSteps = 240;
const goldenSteps = 80;
const golden = (Math.sqrt(5) - 1) / 2;

/** Weights n·w_i of a fit: all 1, or (1/h_i)/Σ(1/h_j) times n, which lets the finer grids count more. */
function fitWeights(grids: readonly GridValue[], weighted: boolean): number[] {
  if (!weighted) return grids.map(() => 1);
  const sum = grids.reduce((total, { h }) => total + 1 / h, 0);
  return grids.map(({ h }) => grids.length / h / sum);
}

function fitTerms(grids: readonly GridValue[], terms: (h: number) => number[], weights: readonly number[]): { solution: number[]; fitted: number[]; sum: number } | null {
  const rows = grids.map(({ h }) => [1, ...terms(h)]);
  const solution = solveLeastSquares(rows, grids.map(({ value }) => value), weights);
  if (solution === null) return null;
  const fitted = rows.map((row) => row.reduce((total, factor, j) => total + factor * (solution[j] ?? 0), 0));
  const sum = grids.reduce((total, { value }, i) => total + (weights[i] ?? 1) * (value - (fitted[i] ?? 0)) ** 2, 0);
  return { solution, fitted, sum };
}

/**
 * The fit φ = φ0 + αh (`first-term`), φ0 + αh² (`second-term`) or φ0 + α1h + α2h² (`two-terms`), with or without weights
 * (1/h_i)/Σ(1/h_j), and its spread σ² = Σ n·w_i(φ_i − fit)²/(n − 2), n − 3 for two terms. L. Eça and M. Hoekstra,
 * J. Comput. Phys. 262 (2014) 104, appendix, as remembered. Null with too few grids for a spread.
 */
export function fitFixedTerms(grids: readonly GridValue[], kind: keyof typeof exponents, weighted: boolean): FittedValues | null {
  const powers = exponents[kind];
  const freedom = grids.length - 1 - powers.length;
  const found = freedom > 0 ? fitTerms(grids, (h) => powers.map((power) => h ** power), fitWeights(grids, weighted)) : null;
  if (found === null) return null;
  const [value0 = 0, ...alpha] = found.solution;
  return { kind, weighted, value0, alpha, order: powers.length === 1 ? powers[0] : null, sigma: Math.sqrt(found.sum / freedom), atBound: null, fitted: found.fitted };
}

/**
 * The fit φ = φ0 + αh^p with its order p, by a scan of p over [−2, 10] refined by golden section; for each p the rest is
 * a line. σ² = Σ n·w_i(φ_i − fit)²/(n − 3). `atBound` tells a fit that ends at a bound of the search: no order then.
 * Eça and Hoekstra 2014, eqs. (13)–(16), as remembered. Null with fewer than four grids.
 */
export function fitPowerTerm(grids: readonly GridValue[], weighted: boolean): FittedValues | null {
  const freedom = grids.length - 3;
  const finest = Math.min(...grids.map(({ h }) => h));
  const weights = fitWeights(grids, weighted);
  // (h^p − 1)/p runs smoothly through p = 0, where h^p is one with the constant.
  const basis = (p: number) => (h: number) => [p === 0 ? Math.log(h / finest) : Math.expm1(p * Math.log(h / finest)) / p];
  const residual = (p: number) => fitTerms(grids, basis(p), weights)?.sum ?? Infinity;
  const p = freedom > 0 ? leastOf(residual) : 0;
  const found = freedom > 0 ? fitTerms(grids, basis(p), weights) : null;
  if (found === null || p === 0) return null;
  const [constant = 0, slope = 0] = found.solution;
  const margin = 1e-6;
  return {
    kind: 'power', weighted, value0: constant - slope / p, alpha: [slope / p / finest ** p], order: p, sigma: Math.sqrt(found.sum / freedom),
    atBound: p < searchBounds.lowest + margin ? 'lowest' : p > searchBounds.highest - margin ? 'highest' : null, fitted: found.fitted,
  };
}

function leastOf(residual: (p: number) => number): number {
  const { lowest, highest } = searchBounds;
  const step = (highest - lowest) / scanSteps;
  const scanned = Array.from({ length: scanSteps + 1 }, (_, i) => lowest + i * step);
  const best = scanned.reduce((least, p) => (residual(p) < residual(least) ? p : least), lowest);
  let [low, high] = [Math.max(lowest, best - step), Math.min(highest, best + step)];
  for (let i = 0; i < goldenSteps; i += 1) {
    const [left, right] = [high - golden * (high - low), low + golden * (high - low)];
    if (residual(left) <= residual(right)) high = right;
    else low = left;
  }
  return (low + high) / 2;
}
