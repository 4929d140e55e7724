import type { OrderFit } from '../assessment';
import { studentT } from './student-t';

/** Two-sided 95 %. */
const probability = 0.975;
/** Fewer points leave so few degrees of freedom that a spread says nothing. */
const gridsForSpread = 4;

/**
 * Slope of ln E over ln h through all grids, by least squares, with the spread of the fit: slope ± t·s/√Σ(x−x̄)² with
 * Student t for n − 2 degrees of freedom, from four grids on.
 *
 * A spread of fit and no confidence interval: systematic curvature is not noise. Returns null with fewer than two grids,
 * one spacing, or an error of zero (no logarithm); low and high are null with fewer than four.
 */
export function leastSquaresOrder(grids: readonly { h: number; error: number }[]): OrderFit | null {
  const n = grids.length;
  if (n < 2 || grids.some((grid) => grid.error === 0)) return null;
  const x = grids.map((grid) => Math.log(grid.h));
  const y = grids.map((grid) => Math.log(grid.error));
  const meanX = mean(x);
  const meanY = mean(y);
  let sumXX = 0;
  let sumXY = 0;
  x.forEach((value, i) => {
    sumXX += (value - meanX) ** 2;
    sumXY += (value - meanX) * ((y[i] ?? meanY) - meanY);
  });
  if (sumXX === 0) return null;
  const order = sumXY / sumXX;
  if (n < gridsForSpread) return { order, low: null, high: null };
  let residual = 0;
  x.forEach((value, i) => {
    residual += ((y[i] ?? meanY) - meanY - order * (value - meanX)) ** 2;
  });
  const spread = studentT(probability, n - 2) * Math.sqrt(residual / (n - 2) / sumXX);
  return { order, low: order - spread, high: order + spread };
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}
