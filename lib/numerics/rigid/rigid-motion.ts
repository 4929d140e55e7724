import { solveLeastSquares } from '../fitting/solve-least-squares';

/**
 * A small rigid motion: at x it displaces by translation + rotation × (x − centre). `rotation` is one angle in two
 * dimensions (counter-clockwise), a vector in three, and empty in one; radians, where coordinates and displacements share a unit.
 */
export interface RigidMotion { centre: number[]; translation: number[]; rotation: number[] }

/**
 * Weighted sums over rows of b_j·b_k and e_i·b_j with b = (1, x − origin) and e the components of a displacement's error:
 * `products[j][k]` for j ≤ k, `errors[i][j]`.
 */
export interface RigidSums { origin: number[]; products: number[][]; errors: number[][] }

/**
 * The small rigid motion nearest to e: it makes Σw|e − r|² least. About the weighted centre the translation is the mean of e,
 * and the rotation ω follows from Σw(|x|²ω − x(x·ω)) = Σw x × e, as a body's spin follows from its inertia and moment. Rows on
 * one line leave the turning about it free, and rows at one point all turning: it is then 0.
 */
export function bestRigidMotion({ origin, products, errors }: RigidSums): RigidMotion {
  const dimension = origin.length;
  const all = products[0]?.[0] ?? 0;
  if (!(all > 0)) throw new RangeError(`the sum of weights must be above 0, got ${all}`);
  const mean = (j: number) => (products[0]?.[j + 1] ?? 0) / all;
  const translation = errors.map((sums) => (sums[0] ?? 0) / all);
  const spread = (j: number, k: number) => (products[Math.min(j, k) + 1]?.[Math.max(j, k) + 1] ?? 0) - all * mean(j) * mean(k);
  /** Σw (x_j − centre) e_i. */
  const moment = (j: number, i: number) => (errors[i]?.[j + 1] ?? 0) - all * mean(j) * (translation[i] ?? 0);
  const centre = origin.map((at, j) => at + mean(j));
  // Of rows at one point the spread is what rounding leaves of the squares.
  const rounding = atPoint * origin.reduce((sum, _, j) => sum + (products[j + 1]?.[j + 1] ?? 0), 0);
  const isPoint = !(origin.reduce((sum, _, j) => sum + spread(j, j), 0) > rounding);
  return { centre, translation, rotation: isPoint ? [[], [0], [0, 0, 0]][dimension - 1] ?? [] : rotationOf(dimension, spread, moment) };
}

const atPoint = 1e-12;

function rotationOf(dimension: number, spread: (j: number, k: number) => number, moment: (j: number, i: number) => number): number[] {
  if (dimension === 1) return [];
  if (dimension === 2) return [(moment(0, 1) - moment(1, 0)) / (spread(0, 0) + spread(1, 1))];
  const trace = spread(0, 0) + spread(1, 1) + spread(2, 2);
  const inertia = (slack: number) => [0, 1, 2].map((j) => [0, 1, 2].map((k) => (j === k ? trace * (1 + slack) : 0) - spread(j, k)));
  const turning = [moment(1, 2) - moment(2, 1), moment(2, 0) - moment(0, 2), moment(0, 1) - moment(1, 0)];
  return solveLeastSquares(inertia(0), turning) ?? solveLeastSquares(inertia(onLine), turning) ?? [0, 0, 0];
}

/** Of rows on one line the inertia about it is 0; this much of the others stands for it. */
const onLine = 1e-10;

/** Component i of the motion as a sum of a constant and multiples of the coordinates: its value at the centre, and its derivative along each direction. */
export function motionComponent({ translation, rotation }: RigidMotion, i: number): { value: number; gradient: number[] } {
  const [a = 0, b = 0, c = 0] = rotation;
  const turns = rotation.length === 3 ? [[0, -c, b], [c, 0, -a], [-b, a, 0]] : rotation.length === 1 ? [[0, -a], [a, 0]] : [[0]];
  return { value: translation[i] ?? 0, gradient: turns[i] ?? [] };
}
