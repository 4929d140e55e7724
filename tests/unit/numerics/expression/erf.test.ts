import { describe, expect, it } from 'vitest';
import { erf } from '@/lib/numerics/expression/erf';

// Abramowitz and Stegun, Handbook of Mathematical Functions, table 7.1 (10 digits), carried to 20 digits with mpmath.
const table: [number, number][] = [
  [0.01, 0.011283415555849616916], [0.1, 0.1124629160182848922], [0.25, 0.27632639016823693299], [0.5, 0.52049987781304653768],
  [0.84, 0.76514271145499453466], [1, 0.84270079294971486934], [1.25, 0.92290012825645823014], [1.5, 0.96610514647531072707],
  [1.9, 0.99279042923525746995], [2, 0.99532226501895273416], [2.2499, 0.99853656902069274205], [2.5, 0.99959304798255504106],
  [3, 0.99997790950300141456], [4, 0.99999998458274209972], [5, 0.99999999999846254021],
];

describe('erf(x)', () => {
  it.each(table)('at %d is the published value to 6e-16, and odd', (x, value) => {
    expect(Math.abs(erf(x) / value - 1)).toBeLessThanOrEqual(6e-16);
    expect(erf(-x)).toBe(-erf(x));
  });
  it('is 2x/√π for the smallest x, and ±1 far out', () => {
    expect(erf(1e-300)).toBe(1.1283791670955126e-300);
    expect([erf(0), erf(7), erf(-30), erf(Infinity)]).toEqual([0, 1, -1, 1]);
  });
  it('is not a number for what is not a number', () => expect(erf(NaN)).toBeNaN());
  it('joins its two parts without a step', () => {
    expect(Math.abs(erf(1.5) - erf(1.5 - 2 ** -52))).toBeLessThanOrEqual(6e-16);
  });
});
