import { studentT } from '../order/student-t';
import { solveLeastSquares } from './solve-least-squares';

/** Two-sided 95 %. */
const probability = 0.975;

/**
 * How far the scatter of a fit leaves its parameters open: t·√(s²·diag (JᵀJ)⁻¹) with s² = Σ r²/(n − k), Student t for n − k
 * degrees of freedom. A spread of fit and no confidence interval: curvature is not noise. Null without a degree of
 * freedom, or where the parameters cannot be told apart.
 */
export function parameterSpread(jacobian: readonly (readonly number[])[], sum: number): number[] | null {
  const count = jacobian[0]?.length ?? 0;
  const freedom = jacobian.length - count;
  if (freedom < 1) return null;
  const spread: number[] = [];
  const factor = studentT(probability, freedom) * Math.sqrt(sum / freedom);
  // Column j of (JᵀJ)⁻¹ has its diagonal in 1/‖part of column j that the others do not hold‖².
  for (let j = 0; j < count; j += 1) {
    const own = jacobian.map((row) => row[j] ?? 0);
    const others = jacobian.map((row) => row.filter((_, k) => k !== j));
    const shared = solveLeastSquares(others, own);
    if (shared === null) return null;
    const rest = Math.sqrt(own.reduce((total, value, i) => total + (value - (others[i] ?? []).reduce((part, each, k) => part + each * (shared[k] ?? 0), 0)) ** 2, 0));
    if (!(rest > 0)) return null;
    spread.push(factor / rest);
  }
  return spread;
}
