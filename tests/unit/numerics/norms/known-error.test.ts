import { describe, expect, it } from 'vitest';
import { knownError } from '@/lib/numerics/norms/known-error';

describe('knownError({largest, significantDigits, precision}, iterative error)', () => {
  it('is half a unit of the last digit of the largest value', () => {
    expect(knownError({ largest: 300.5, significantDigits: 6 })).toBeCloseTo(0.0005, 15);
    expect(knownError({ largest: 0.0123, significantDigits: 3 })).toBeCloseTo(0.00005, 15);
    expect(knownError({ largest: 1000, significantDigits: 4 })).toBeCloseTo(0.5, 15);
  });
  it('adds the iterative error', () => expect(knownError({ largest: 300, significantDigits: 6 }, 0.001)).toBeCloseTo(0.0015, 15));
  it('is half a unit of float32 where so stored', () => {
    expect(knownError({ largest: 1, significantDigits: null, precision: 'single' })).toBe(2 ** -24);
    expect(knownError({ largest: 3, significantDigits: 17, precision: 'single' })).toBe(2 ** -23);
  });
  it('is the iterative error alone where no digits are printed, or all is 0', () => {
    expect(knownError({ largest: 5, significantDigits: null }, 1e-6)).toBe(1e-6);
    expect(knownError({ largest: 0, significantDigits: 6 })).toBe(0);
  });
  it('throws for what is negative or not finite', () => {
    expect(() => knownError({ largest: Number.NaN, significantDigits: 6 })).toThrow('largest must be 0 or above, got NaN');
    expect(() => knownError({ largest: 1, significantDigits: 6 }, -1)).toThrow('iterativeError must be 0 or above, got -1');
  });
});
