import { describe, expect, it } from 'vitest';
import { compileExpressions, type ExpressionSet } from '@/lib/numerics/expression/compile-expressions';
import { evaluateAt } from '@/lib/numerics/expression/evaluate-at';
import type { Variable } from '@/lib/numerics/expression/node';

type Point = Partial<Record<Variable, number>>;

function compile(set: Partial<ExpressionSet>) {
  return compileExpressions({ constants: {}, fields: {}, variables: ['x', 'y', 't'], ...set });
}

function valueOf(expression: string, point: Point = { x: 2, y: 3, t: 5 }, constants: ExpressionSet['constants'] = {}): number {
  const result = compile({ fields: { u: expression }, constants });
  if (!result.ok) throw new Error(result.errors.map((error) => error.message).join(' '));
  return evaluateAt([result.compiled.fields.u!], point)[0]!;
}

function errorOf(expression: string, constants: ExpressionSet['constants'] = {}) {
  const result = compile({ fields: { u: expression }, constants });
  return result.ok ? null : result.errors.find((error) => error.name === 'u');
}

describe('an expression', () => {
  it.each([
    ['1+2*3', 7], ['(1+2)*3', 9], ['2^3^2', 512], ['-x^2', -4], ['(-x)^2', 4], ['2^-1', 0.5], ['8/4/2', 1], ['8-4-2', 2], ['x*-y', -6],
    ['x - -y', 5], ['+x', 2], ['-(x-y)', 1], ['.5e1*2.', 10], ['1E+2', 100], ['x/y*3', 2], ['pi', Math.PI], ['sin (pi/2)', 1],
    ['exp(log(x))', 2], ['sqrt(x+t+2)', 3], ['atan(1)*4', Math.PI], ['cosh(0)+sinh(0)+tanh(0)', 1], ['acos(1)+asin(0)', 0], ['tan(0)+cos(0)', 1],
    ['erf(1)', 0.8427007929497149], ['(\n x\t+ y )', 5],
  ])('%s is %d at x = 2, y = 3, t = 5', (expression, value) => expect(valueOf(expression)).toBeCloseTo(value, 14));

  it('reads constants that are numbers, expressions of each other and of the coordinates, in any order', () => {
    expect(valueOf('a*x', { x: 2, y: 3, t: 5 }, { a: 'b^2+y', b: '2*c', c: 0.5 })).toBe(8);
  });
  it('reads a constant of the name of one in the library, or of a word of other languages', () => {
    expect(valueOf('pi*e', {}, { pi: 3, e: 7 })).toBe(21);
    expect(valueOf('mod + in*to - not/end + i', {}, { mod: 1, in: 2, to: 3, not: 4, end: 2, i: 9 })).toBe(14);
  });
  it('reads fields of other fields', () => {
    const result = compile({ fields: { E: 'rho*u^2/2', rho: '1+x', u: 'y' } });
    expect(result.ok && evaluateAt([result.compiled.fields.E!], { x: 1, y: 3 })).toEqual([9]);
  });
  it('takes a field of any name, which others cannot name', () => {
    const result = compile({ fields: { 'U:x': 'x', __proto__x: 'x', constructor: 'x' } });
    expect(result.ok && Object.keys(result.compiled.fields)).toEqual(['U:x', '__proto__x', 'constructor']);
  });
});

describe('an expression that is refused names the character', () => {
  it.each([
    ['2x', 2, '2*x'], ['3 cm', 3, '3*cm'], ['x!', 2, 'no factorial'], ['1+0x10', 3, 'decimal'], ['x*1e400', 3, 'too large'], ['1e-400', 1, 'too small'],
    ['x y', 3, 'x*y'], ['sin x', 5, 'sin(x)'], ['2(x)', 2, '2*('], ['(x)(y)', 4, ')*('], ['x(2)', 1, 'not a function'], ['1d3', 1, '1e3'],
    ['x**2', 2, '^'], ['x²', 2, 'x^2'], ['2·x', 2, '*'], ['x−1', 2, 'minus'], ['√x', 1, 'sqrt'], ['x % 2', 3, 'not smooth'], ['u = x', 3, 'right-hand side'],
    ['', 1, 'empty'], ['x+', 3, 'ends after'], ['*x', 1, 'at the beginning'], ['x+*y', 3, 'after “+”'], ['---x', 2, 'after “-”'], ['(x', 1, 'not closed'], ['x)', 2, 'without'],
    ['()', 2, 'expected'], ['0,5', 2, 'decimal mark'], ['sin(x,y)', 1, 'one value'], ['foo(x)', 1, 'not known'], ['ln(x)', 1, 'log(a)'], ['x+q', 3, 'not known'],
    ['z', 1, 'not a coordinate'], ['sin*2', 1, 'sin(…)'], ['e', 1, 'not known'], ['i', 1, 'not known'], ['abs(x)', 1, 'not smooth'], ['x+sign(x)', 3, 'not smooth'],
    ['min(x,y)', 1, 'not smooth'], ['max(x,y)', 1, 'not smooth'], ['if(x,1,2)', 1, 'not smooth'], ['x[1]', 2, 'parentheses'], ['"a"', 1, 'expected'],
    ['x;y', 2, 'expected'], ['1/0', 1, 'zero'], ['x+1/(2-2)', 3, 'zero'], ['log(0)', 1, 'finite'], ['sqrt(-1)', 1, 'finite'], ['(-8)^(1/3)', 3, 'finite'],
    ['d(x,x)', 3, 'field'], ['d(u,2)', 5, 'x, y, t'], ['d(u)', 1, 'd(u, x)'], ['u+1', 1, 'circle'],
    ['import("fs")', 8, 'expected'], ['constructor(x)', 1, 'not known'], ['toString', 1, 'not known'],
  ])('%s at %i', (expression, position, words) => {
    const error = errorOf(expression);
    expect(error?.position).toBe(position);
    expect(error?.message).toContain(words);
  });

  it('in every place that is wrong, by name', () => {
    const result = compile({ constants: { a: 'b', b: 'a', sin: 1, '2k': 1, x: 3 }, fields: { u: 'x+', v: '1' }, compared: { v: 'w' } });
    expect(result.ok ? [] : result.errors.map(({ name }) => name).sort()).toEqual(['2k', 'a', 'b', 'sin', 'u', 'v', 'x']);
  });

  it('where it is longer or deeper than anybody needs', () => {
    expect(errorOf(`${'x+'.repeat(3000)}x`)?.message).toContain('characters');
    expect(errorOf(`${'('.repeat(101)}x${')'.repeat(101)}`)?.message).toContain('parentheses');
    expect(valueOf(`${'x+'.repeat(1900)}x`, { x: 1 })).toBe(1901);
    expect(valueOf(`${'x^'.repeat(1900)}x`, { x: 1 })).toBe(1);
  });
});
