const exactAt = (x: number) => Math.sin(2 * x) + 1;

/**
 * u′ = 2 cos 2x on n cells of the unit interval by the second-order backward difference from two exact cells on, with a
 * last cell that takes the value of the one before it: a closure of first order, which spoils nothing upstream.
 */
export function outflowTable(n: number): Buffer {
  const h = 1 / n;
  const x = Array.from({ length: n }, (_, i) => (i + 0.5) * h);
  const u: number[] = [];
  for (const [i, at] of x.entries()) {
    const [one = 0, two = 0] = [u[i - 1], u[i - 2]];
    u.push(i < 2 ? exactAt(at) : i === n - 1 ? one : (4 * one - two + 2 * h * 2 * Math.cos(2 * at)) / 3);
  }
  return Buffer.from(`${['x,w,u', ...x.map((at, i) => `${at},${h},${u[i]}`)].join('\n')}\n`);
}

export const outflowProblem = { equation: 'none', dimension: 1, exact: { u: 'sin(2*x) + 1' }, domain: { x: [0, 1] } } as const;
