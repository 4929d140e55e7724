import { solveLeastSquares } from './solve-least-squares';

const mostSteps = 200;
const settled = 1e-14;
const difference = 1e-6;

interface Minimum { parameters: number[]; sum: number; jacobian: number[][] }

/**
 * The parameters near `start` that make the sum of squared residuals least: Levenberg's damped steps with Marquardt's
 * scaling (D. W. Marquardt, J. SIAM 11 (1963) 431), derivatives by central differences. Deterministic. `sum` is the least
 * sum found; where the start or every step gives no finite sum it is Infinity.
 */
export function levenbergMarquardt(residuals: (parameters: readonly number[]) => number[], start: readonly number[]): Minimum {
  let parameters = [...start];
  let sum = sumOf(residuals(parameters));
  let damping = 1e-3;
  let jacobian = differentiate(residuals, parameters);
  for (let step = 0; step < mostSteps && damping < 1e16; step += 1) {
    const move = dampedStep(jacobian, residuals(parameters), damping);
    const next = move && parameters.map((value, i) => value + (move[i] ?? 0));
    const nextSum = next ? sumOf(residuals(next)) : Infinity;
    if (!next || !(nextSum < sum)) {
      damping *= 4;
      continue;
    }
    const gain = sum - nextSum;
    parameters = next;
    sum = nextSum;
    damping = Math.max(damping / 9, 1e-14);
    jacobian = differentiate(residuals, parameters);
    if (gain <= settled * sum) break;
  }
  return { parameters, sum, jacobian };
}

function sumOf(residuals: readonly number[]): number {
  const sum = residuals.reduce((total, value) => total + value * value, 0);
  return Number.isFinite(sum) ? sum : Infinity;
}

function differentiate(residuals: (parameters: readonly number[]) => number[], at: readonly number[]): number[][] {
  const columns = at.map((value, j) => {
    const width = difference * Math.max(Math.abs(value), 1e-3);
    const moved = (by: number) => residuals(at.map((each, k) => (k === j ? each + by : each)));
    const [ahead, behind] = [moved(width), moved(-width)];
    return ahead.map((each, i) => (each - (behind[i] ?? 0)) / (2 * width));
  });
  return (columns[0] ?? []).map((_, i) => columns.map((column) => column[i] ?? 0));
}

function dampedStep(jacobian: readonly number[][], residuals: readonly number[], damping: number): number[] | null {
  const count = jacobian[0]?.length ?? 0;
  const scales = Array.from({ length: count }, (_, j) => Math.sqrt(jacobian.reduce((sum, row) => sum + (row[j] ?? 0) ** 2, 0)) || 1);
  const damped = scales.map((scale, j) => scales.map((_, k) => (k === j ? Math.sqrt(damping) * scale : 0)));
  return solveLeastSquares([...jacobian, ...damped], [...residuals.map((value) => -value), ...scales.map(() => 0)]);
}
