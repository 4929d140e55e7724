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
  const uncertainty = (coarse.knownError / coarse.error + fine.knownError / fine.error) / logRatio;
  return {
    order: logOfQuotient(coarse.error, fine.error) / logRatio,
    uncertainty: Math.min(uncertainty, Number.MAX_VALUE),
  };
}

/** ln(a/b), also where a/b itself is beyond a double. */
function logOfQuotient(a: number, b: number): number {
  const quotient = a / b;
  return quotient > 0 && Number.isFinite(quotient) ? Math.log(quotient) : Math.log(a) - Math.log(b);
}
