interface GridValue { h: number; value: number }

/** Three grids as differences and ratios: ε21 = φ2 − φ1, ε32 = φ3 − φ2, r21 = h2/h1, r32 = h3/h2, grid 1 the finest. */
export interface GridTriple { e21: number; e32: number; r21: number; r32: number }

/** Differences and ratios of three grids. Throws where the spacings do not rise from the fine to the coarse one. */
export function gridTriple(fine: GridValue, middle: GridValue, coarse: GridValue): GridTriple {
  const r21 = middle.h / fine.h;
  const r32 = coarse.h / middle.h;
  if (!(r21 > 1 && r32 > 1)) throw new RangeError(`spacings must rise from fine to coarse, got ${fine.h}, ${middle.h}, ${coarse.h}`);
  return { e21: middle.value - fine.value, e32: coarse.value - middle.value, r21, r32 };
}
