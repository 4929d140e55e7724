import katex from 'katex';
import { describe, expect, it } from 'vitest';
import { expressionToTex, nameToTex } from '@/lib/numerics/expression/to-tex';

describe('expressionToTex(text)', () => {
  it.each([
    ['sin(pi*x)', '\\sin\\left(\\pi\\,x\\right)'],
    ['(a+b)*x', '\\left(a + b\\right)\\,x'],
    ['a-(b+c)', 'a - \\left(b + c\\right)'],
    ['a-(b-c)', 'a - \\left(b - c\\right)'],
    ['a*(-b)', 'a\\,\\left(-b\\right)'],
    ['x/(1+y)', '\\frac{x}{1 + y}'],
    ['(x/y)^2', '\\left(\\frac{x}{y}\\right)^{2}'],
    ['-x^2', '-x^{2}'],
    ['(-x)^2', '\\left(-x\\right)^{2}'],
    ['exp(-t)^2', '\\left(e^{-t}\\right)^{2}'],
    ['2*3', '2\\cdot 3'],
    ['1e-3*log(nu_0)', '1\\cdot 10^{-3}\\,\\ln\\left(\\nu_{\\mathrm{0}}\\right)'],
    ['x^y^z', 'x^{y^{z}}'],
  ])('sets %s as %s', (text, tex) => {
    expect(expressionToTex(text)).toBe(tex);
    expect(() => katex.renderToString(tex, { throwOnError: true })).not.toThrow();
  });

  it('names the place of what is not in the grammar', () => {
    expect(() => expressionToTex('2x')).toThrow();
  });
});

it('nameToTex(name) sets Greek names as letters and digits as an index', () => {
  expect([nameToTex('nu'), nameToTex('T0'), nameToTex('u_in'), nameToTex('T')]).toEqual(['\\nu', 'T_{\\mathrm{0}}', 'u_{\\mathrm{in}}', 'T']);
});
