import { describe, expect, it } from 'vitest';
import { createCompensatedSum } from '@/lib/numerics/norms/compensated-sum';

function sum(values: number[]): number {
  const total = createCompensatedSum();
  for (const value of values) total.add(value);
  return total.value();
}

describe('createCompensatedSum()', () => {
  it('is 0 before anything is added', () => expect(sum([])).toBe(0));
  // Neumaier's own example of what Kahan's sum loses.
  it('of 1, 1e100, 1, −1e100 is 2', () => expect(sum([1, 1e100, 1, -1e100])).toBe(2));
  it('of ten million tenths is a million', () => expect(sum(Array.from({ length: 10_000_000 }, () => 0.1))).toBe(1_000_000));
});
