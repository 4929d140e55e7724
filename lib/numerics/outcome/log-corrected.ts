interface LogFactor { power: number; length: number }

/**
 * What a logarithm multiplies an error by: |ln(h/L)|^k for an error C·h^p·|ln(h/L)|^k, as of linear elements in L∞. The
 * error divided by it falls at order p. L is the length of the domain, in the unit of h.
 *
 * Throws where h is not below L, since the logarithm vanishes there and nothing can be divided by it.
 */
export function logPart(h: number, { power, length }: LogFactor): number {
  if (!(length > 0)) throw new RangeError(`length must be above 0, got ${length}`);
  if (!(h < length)) throw new RangeError(`h must be below the length ${length} of the domain for a log factor, got ${h}`);
  return Math.abs(Math.log(h / length)) ** power;
}
