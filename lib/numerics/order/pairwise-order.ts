interface GridError {
  h: number;
  error: number;
  /** Known error δ of the error, in its unit: storage resolution and iteration. */
  knownError: number;
}

/**
 * Order seen between two grids whose errors are known: p = ln(Ec/Ef)/ln r with r = hc/hf, and how far the known errors
 * could move it, u = (δc/Ec + δf/Ef)/ln r.
 *
 * Not for values without an exact solution: that takes three grids. Returns nulls where an error is zero, because the
 * logarithm has no value there. Throws where the coarse spacing is not the larger one.
 */
export function pairwiseOrder(coarse: GridError, fine: GridError): { order: number | null; uncertainty: number | null } {
  const logRatio = Math.log(coarse.h / fine.h);
  if (!(logRatio > 0)) throw new RangeError(`coarse.h must exceed fine.h, got ${coarse.h} and ${fine.h}`);
  if (coarse.error === 0 || fine.error === 0) return { order: null, uncertainty: null };
  return {
    order: Math.log(coarse.error / fine.error) / logRatio,
    uncertainty: (coarse.knownError / coarse.error + fine.knownError / fine.error) / logRatio,
  };
}
