interface Parts { factor: number; iterative: number; time: number }

/**
 * Standard uncertainty u_num of the finest value, in its unit: the band of about 95 % divided by k, with the iterative and
 * time parts added in quadrature. ASME V&V 20-2009: k from 1.1 to 1.15 for a shifted Gaussian with a safety factor of
 * 1.25, 2 for a Gaussian; it must be stated. Null where there is no band. Throws for a factor of 0 or less.
 */
export function numericalUncertainty(band: number | null, { factor, iterative, time }: Parts): number | null {
  if (!(factor > 0)) throw new RangeError(`factor must be above 0, got ${factor}`);
  return band === null ? null : Math.hypot(band / factor, iterative, time);
}
