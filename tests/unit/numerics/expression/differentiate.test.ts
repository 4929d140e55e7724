import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createBlockEvaluator } from '@/lib/numerics/expression/block-evaluator';
import { compileExpressions } from '@/lib/numerics/expression/compile-expressions';
import { evaluateAt } from '@/lib/numerics/expression/evaluate-at';
import type { Node } from '@/lib/numerics/expression/node';
import { listNodes } from '@/lib/numerics/expression/list-nodes';

function compileCompared(fields: Record<string, string>, compared: Record<string, string>, constants = {}): Record<string, Node> {
  const result = compileExpressions({ constants, fields, compared, variables: ['x', 'y', 'z', 't'] });
  if (!result.ok) throw new Error(JSON.stringify(result.errors));
  return { ...result.compiled.fields, ...result.compiled.compared };
}

describe('d(field, x)', () => {
  it.each([
    ['x^3', '3*x^2'], ['x^-2', '-2/x^3'], ['1/x', '-1/x^2'], ['sqrt(x)', '0.5/sqrt(x)'], ['exp(2*x)', '2*exp(2*x)'], ['log(3*x)', '1/x'],
    ['sin(x)*cos(x)', 'cos(2*x)'], ['tan(x)', '1/cos(x)^2'], ['asin(x)', '1/sqrt(1-x^2)'], ['acos(x)', '-1/sqrt(1-x^2)'], ['atan(x)', '1/(1+x^2)'],
    ['sinh(x)', 'cosh(x)'], ['cosh(x)', 'sinh(x)'], ['tanh(x)', '1/cosh(x)^2'], ['erf(x)', '2/sqrt(pi)*exp(-x^2)'], ['x^x', 'x^x*(log(x)+1)'],
    ['2^x', '2^x*log(2)'], ['x^y', 'y*x^(y-1)'], ['y*t', '0'], ['(x+y)/(x-y)', '-2*y/(x-y)^2'], ['-(x-y)', '-1'], ['x*y*x', '2*x*y'],
  ])('of %s is %s', (field, derivative) => {
    const nodes = compileCompared({ u: field, v: derivative }, { du: 'd(u, x)' });
    for (const x of [0.21, 0.5, 0.83]) {
      const [found, expected] = evaluateAt([nodes.du!, nodes.v!], { x, y: 1.7, z: 0, t: 2 });
      expect(found).toBeCloseTo(expected!, 12);
    }
  });

  it('is the difference quotient of any smooth expression', () => {
    const leaf = fc.constantFrom('x', 'y', '2', '0.5', 'pi');
    const { tree } = fc.letrec<{ tree: string }>((tie) => ({
      tree: fc.oneof({ maxDepth: 4, depthIdentifier: 'tree' }, leaf,
        fc.tuple(tie('tree'), fc.constantFrom('+', '-', '*'), tie('tree')).map(([a, operator, b]) => `(${a}${operator}${b})`),
        fc.tuple(fc.constantFrom('sin', 'cos', 'tanh', 'atan', 'erf'), tie('tree')).map(([name, a]) => `${name}(${a})`),
        fc.tuple(tie('tree'), tie('tree')).map(([a, b]) => `((${a})/(2+sin(${b})))`),
        tie('tree').map((a) => `(2+cos(${a}))^1.5`)),
    }));
    fc.assert(fc.property(tree, (field) => {
      const nodes = compileCompared({ u: field }, { du: 'd(u, x)' });
      const at = (x: number) => evaluateAt([nodes.u!, nodes.du!], { x, y: 0.7, z: 0, t: 0 });
      const h = 1e-4;
      const quotient = (8 * (at(0.3 + h)[0]! - at(0.3 - h)[0]!) - (at(0.3 + 2 * h)[0]! - at(0.3 - 2 * h)[0]!)) / (12 * h);
      const [value, derivative] = at(0.3);
      const steepest = Math.max(...[-2, -1, 0, 1, 2].map((step) => Math.abs(at(0.3 + step * h)[1]!)));
      fc.pre(steepest < 100);
      expect(Math.abs(quotient - derivative!)).toBeLessThan(1e-7 * (1 + Math.abs(value!) + steepest ** 2));
    }), { numRuns: 300, seed: 4 });
  });

  // Sources of −div(k grad u) to 30 digits (SymPy and mpmath), three problems in one, two and three dimensions.
  it.each([
    ['1+x/2', 'sin(3*x)+x^3/5', { x: 0.341, y: 0, z: 0 }, 7.69796792007924352905071191885],
    ['1', 'exp(x/2)*sin(pi*y)', { x: 0.379, y: 0.102, z: 0 }, 3.66224997377515747415246897081],
    ['1+x*y/4+z^2/8', 'cos(pi*x)*sin(2*y)*exp(-z)', { x: 0.251, y: 0.615, z: 0.903 }, 4.13238169568623010032426447069],
  ])('gives the source of diffusion with k = %s, u = %s', (k, u, point, source) => {
    const flux = (by: string) => `d(k,${by})*d(u,${by})+k*d(d(u,${by}),${by})`;
    const nodes = compileCompared({ k, u }, { s: `-(${flux('x')}+${flux('y')}+${flux('z')})` });
    expect(evaluateAt([nodes.s!], { ...point, t: 0 })[0]! / source).toBeCloseTo(1, 13);
  });

  it('of the sixth order stays a small graph', () => {
    const nodes = compileCompared({ u: 'sin(pi*x)*exp(-x*y)*cos(2*y)' }, { s: 'd(d(d(d(d(d(u,x),x),x),y),y),y)' });
    expect(listNodes([nodes.s!]).length).toBeLessThan(1500);
  });
});

describe('the graph', () => {
  it('has equal parts once, across fields and sides of a sum', () => {
    const nodes = compileCompared({ u: 'sin(x*y)+1', v: '1+sin(y*x)', w: 'sin(x*y)' }, {});
    expect(nodes.u).toBe(nodes.v);
    expect(listNodes([nodes.u!, nodes.w!])).toHaveLength(6);
  });

  it.each([['x*0', '0'], ['x*1', 'x'], ['0+x', 'x'], ['x-x', '0'], ['x^1', 'x'], ['x^0', '1'], ['--x', 'x'], ['2*(3*x)', '6*x'], ['x+(-y)', 'x-y'], ['sin(0)*x+2*3', '6']])(
    'folds %s to %s', (long, short) => {
      const nodes = compileCompared({ u: long.replace('--x', '-(-x)'), v: short }, {});
      expect(nodes.u).toBe(nodes.v);
    },
  );
});

describe('createBlockEvaluator(nodes)', () => {
  const nodes = compileCompared({ u: 'sin(x)*y+t^2', v: 'sin(x)/y-x^3', w: 'x', c: '4', p: 'x^y' }, {});
  const names = ['u', 'v', 'w', 'c', 'p', 'u'];
  const evaluate = createBlockEvaluator(names.map((name) => nodes[name]!));
  const x = Float64Array.from({ length: 2048 }, (_, i) => 1 + i / 1000);
  const y = Float64Array.from({ length: 2048 }, (_, i) => 2 - i / 2048);

  it('gives every node in its place, row by row, again and again', () => {
    for (const rows of [2048, 1, 700]) {
      const columns = evaluate(rows, { x, y, t: 3 });
      for (const i of [0, rows - 1]) {
        const [a, b] = [x[i]!, y[i]!];
        expect(columns.map((column) => column[i])).toEqual([Math.sin(a) * b + 9, Math.sin(a) / b - a * a * a, a, 4, a ** b, Math.sin(a) * b + 9]);
      }
    }
  });
  it('uses the same columns for the next block', () => {
    expect(evaluate(10, { x, y, t: 3 })[0]).toBe(evaluate(10, { x, y, t: 4 })[0]);
  });
  it('shows where an expression is not defined', () => {
    const log = createBlockEvaluator([compileCompared({ u: 'log(x)' }, {}).u!]);
    expect([...log(3, { x: Float64Array.of(1, 0, -1) })[0]!.subarray(0, 3)]).toEqual([0, -Infinity, NaN]);
  });
  it('throws for a coordinate without values and for too many rows', () => {
    expect(() => evaluate(1, { x, y })).toThrow('no values were given for t');
    expect(() => evaluate(2049, { x, y, t: 0 })).toThrow('2049 rows');
  });
});
