/** Halvings of [0, π/2]: the angle is then known to the last bit. */
const halvings = 60;

/**
 * The t above which a Student t variable of `freedom` degrees of freedom lies with probability 1 − p, for p from ½ to 1.
 *
 * Found by halving on the angle θ = arctan(t/√ν) from the finite sums for P(|T| ≤ t) of M. Abramowitz and I. A. Stegun,
 * Handbook of Mathematical Functions (1964), 26.7.3 (odd ν) and 26.7.4 (even ν). Throws where ν is not a whole number
 * above 0 or p lies outside [½, 1).
 */
export function studentT(p: number, freedom: number): number {
  if (!Number.isInteger(freedom) || freedom < 1) throw new RangeError(`freedom must be a whole number above 0, got ${freedom}`);
  if (!(p >= 0.5 && p < 1)) throw new RangeError(`p must lie in [0.5, 1), got ${p}`);
  const twoSided = 2 * p - 1;
  let low = 0;
  let high = Math.PI / 2;
  for (let i = 0; i < halvings; i += 1) {
    const middle = (low + high) / 2;
    if (probabilityWithin(middle, freedom) < twoSided) low = middle;
    else high = middle;
  }
  return Math.sqrt(freedom) * Math.tan((low + high) / 2);
}

function probabilityWithin(theta: number, freedom: number): number {
  const cosine = Math.cos(theta);
  const odd = freedom % 2 === 1;
  let term = odd ? cosine : 1;
  let sum = freedom === 1 ? 0 : term;
  for (let k = odd ? 3 : 2; k <= freedom - 2; k += 2) {
    term *= ((k - 1) / k) * cosine * cosine;
    sum += term;
  }
  return odd ? (2 / Math.PI) * (theta + Math.sin(theta) * sum) : Math.sin(theta) * sum;
}
