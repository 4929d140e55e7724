import { describe, expect, it } from 'vitest';
import { createAverageEvaluator } from '@/lib/numerics/expression/average-evaluator';
import { compileExpressions } from '@/lib/numerics/expression/compile-expressions';
import { gaussLegendre } from '@/lib/numerics/expression/gauss-legendre';

describe('gaussLegendre(n)', () => {
  // M. Abramowitz and I. A. Stegun, Handbook of Mathematical Functions (1964), table 25.4.
  it.each([[2, 0.577350269189626, 1], [3, 0.774596669241483, 5 / 9], [5, 0.906179845938664, 0.236926885056189], [8, 0.960289856497536, 0.101228536290376]])('of %d has its outermost point at %d', (n, point, weight) => {
    expect(gaussLegendre(n)[0]?.point).toBeCloseTo(point, 14);
    expect(gaussLegendre(n)[0]?.weight).toBeCloseTo(weight, 14);
  });
  it('is exact up to degree 2n − 1 and not beyond', () => {
    const integrate = (n: number, k: number) => gaussLegendre(n).reduce((sum, { point, weight }) => sum + weight * point ** k, 0);
    for (let n = 1; n <= 8; n += 1) {
      expect(integrate(n, 2 * n - 2)).toBeCloseTo(2 / (2 * n - 1), 13);
      expect(Math.abs(integrate(n, 2 * n) - 2 / (2 * n + 1))).toBeGreaterThan(1e-6);
    }
  });
  it('throws for no points', () => expect(() => gaussLegendre(0)).toThrow('n must be a whole number from 1 to 20, got 0'));
});

describe('createAverageEvaluator(nodes, points)', () => {
  const compiled = compileExpressions({ constants: { k: 3 }, fields: { u: 'k*exp(x)*cos(y)', v: 'x*y*y' }, variables: ['x', 'y'] });
  if (!compiled.ok) throw new Error('The expressions do not compile.');
  const { u, v } = compiled.compiled.fields;
  if (!u || !v) throw new Error('A field is missing.');

  it('gives cell averages, cells of any size', () => {
    const [x, y, dx] = [[0.2, 0.7], [0.1, 0.9], [0.1, 0.4]].map((values) => Float64Array.from(values));
    if (!x || !y || !dx) throw new Error('No rows.');
    const [ofU, ofV] = createAverageEvaluator([u, v], 4)(2, { x, y }, { x: dx, y: 0.2 });
    [0, 1].forEach((i) => {
      const [a, b, c, d] = [(x[i] ?? 0) - (dx[i] ?? 0) / 2, (x[i] ?? 0) + (dx[i] ?? 0) / 2, (y[i] ?? 0) - 0.1, (y[i] ?? 0) + 0.1];
      expect(ofU?.[i]).toBeCloseTo((3 * (Math.exp(b) - Math.exp(a)) * (Math.sin(d) - Math.sin(c))) / ((b - a) * 0.2), 10);
      expect(ofV?.[i]).toBeCloseTo((((a + b) / 2) * (d ** 3 - c ** 3)) / 3 / 0.2, 14);
    });
  });
});
