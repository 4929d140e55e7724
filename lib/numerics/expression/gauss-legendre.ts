const settled = 1e-15;
const mostSteps = 50;

/**
 * Points in [−1, 1] and weights of the Gauss–Legendre rule of n points, exact for polynomials up to degree 2n − 1; the
 * weights sum to 2. Roots of the Legendre polynomial by Newton's method from cos(π(i − ¼)/(n + ½)), M. Abramowitz and
 * I. A. Stegun, Handbook of Mathematical Functions (1964), 25.4.29. Throws unless n is a whole number from 1 to 20.
 */
export function gaussLegendre(n: number): { point: number; weight: number }[] {
  if (!Number.isInteger(n) || n < 1 || n > 20) throw new RangeError(`n must be a whole number from 1 to 20, got ${n}`);
  return Array.from({ length: n }, (_, i) => {
    let x = Math.cos((Math.PI * (i + 0.75)) / (n + 0.5));
    let slope = 1;
    for (let step = 0; step < mostSteps; step += 1) {
      const found = legendre(n, x);
      slope = found.slope;
      const change = found.value / slope;
      x -= change;
      if (Math.abs(change) <= settled) break;
    }
    slope = legendre(n, x).slope;
    return { point: x, weight: 2 / ((1 - x * x) * slope * slope) };
  });
}

function legendre(n: number, x: number): { value: number; slope: number } {
  let [before, value] = [1, x];
  for (let k = 2; k <= n; k += 1) [before, value] = [value, ((2 * k - 1) * x * value - (k - 1) * before) / k];
  return { value, slope: (n * (x * value - before)) / (x * x - 1) };
}
