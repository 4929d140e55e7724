interface GridValue { h: number; value: number }

/**
 * Richardson's extrapolation from two grids to h = 0: φ_ext = (r^p φ1 − φ2)/(r^p − 1), r = h2/h1, with φ1 on the finer.
 *
 * Not for p ≤ 0 or oscillating values, where nothing is being approached: throws. L. F. Richardson, Phil. Trans. R. Soc.
 * A 210 (1911) 307; form of Celik et al., J. Fluids Eng. 130 (2008) 078001.
 */
export function richardson(fine: GridValue, coarse: GridValue, order: number): number {
  if (!(order > 0)) throw new RangeError(`order must be above 0, got ${order}`);
  const growth = Math.expm1(order * Math.log(coarse.h / fine.h));
  return fine.value + (fine.value - coarse.value) / growth;
}
