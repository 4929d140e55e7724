interface GridValue { h: number; value: number }

/** Where C counts as near 1, and the constants of both branches: ITTC 7.5-03-01-01, as remembered. */
export const correctionConstants = { near: 0.125, nearCurvature: 9.6, nearBase: 1.1, farSlope: 2, farBase: 1 } as const;

interface Corrected { correctionFactor: number; multiplier: number; uncertainty: number; branch: 'near-asymptotic' | 'far-from-asymptotic' }

/**
 * Uncertainty U of the finest value from the correction factor C = (r21^p − 1)/(r21^pf − 1), which tells how far the
 * grids are from the asymptotic range: with δ = (φ2 − φ1)/(r21^p − 1), U = (9.6(1 − C)² + 1.1)|δ| where |1 − C| < 0.125,
 * else (2|1 − C| + 1)|δ|. F. Stern, R. V. Wilson, H. W. Coleman, E. G. Paterson, J. Fluids Eng. 123 (2001) 793, with the
 * factors of ITTC 7.5-03-01-01, as remembered. `order` is the observed one.
 *
 * U, and no GCI. Not for oscillating values or an order of 0 or less: throws.
 */
export function correctionFactor({ fine, middle }: { fine: GridValue; middle: GridValue }, order: number, formalOrder: number): Corrected {
  if (!(order > 0)) throw new RangeError(`order must be above 0, got ${order}`);
  if (!(formalOrder > 0)) throw new RangeError(`formalOrder must be above 0, got ${formalOrder}`);
  const growth = (p: number) => Math.expm1(p * Math.log(middle.h / fine.h));
  const factor = growth(order) / growth(formalOrder);
  const distance = Math.abs(1 - factor);
  const { near, nearCurvature, nearBase, farSlope, farBase } = correctionConstants;
  const isNear = distance < near;
  const multiplier = isNear ? nearCurvature * distance ** 2 + nearBase : farSlope * distance + farBase;
  return {
    correctionFactor: factor, multiplier, uncertainty: multiplier * Math.abs((middle.value - fine.value) / growth(order)),
    branch: isNear ? 'near-asymptotic' : 'far-from-asymptotic',
  };
}
