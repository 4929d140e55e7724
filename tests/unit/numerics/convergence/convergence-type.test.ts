import { describe, expect, it } from 'vitest';
import { convergenceType } from '@/lib/numerics/convergence/convergence-type';

describe('convergenceType(triple, half units)', () => {
  const equal = (e21: number, e32: number) => convergenceType({ e21, e32, r21: 2, r32: 2 });
  it('is monotone for 0 < R < 1 at equal ratios', () => expect(equal(1, 4)).toBe('monotone'));
  it('is divergent at R = 1 and above', () => {
    expect(equal(1, 1)).toBe('divergent');
    expect(equal(-3, -1)).toBe('divergent');
  });
  it('is oscillatory for −1 < R < 0 and oscillatory-divergent from −1 down', () => {
    expect(equal(-1, 4)).toBe('oscillatory');
    expect(equal(-4, 4)).toBe('oscillatory-divergent');
    expect(equal(5, -4)).toBe('oscillatory-divergent');
  });
  it('has the bound ln r21/ln r32, not 1, at unequal ratios', () => {
    expect(convergenceType({ e21: 0.7, e32: 1, r21: 1.5, r32: 2 })).toBe('divergent');
    expect(convergenceType({ e21: 1.5, e32: 1, r21: 2, r32: 1.5 })).toBe('monotone');
  });
  it('is unchanged where a difference is no larger than the half units of its two values', () => {
    expect(convergenceType({ e21: 1.1 - 1, e32: 1, r21: 2, r32: 2 }, [0.05, 0.05, 0.05])).toBe('unchanged');
    expect(convergenceType({ e21: 0.2, e32: 0.05, r21: 2, r32: 2 }, [0.05, 0.05, 0.05])).toBe('unchanged');
    expect(equal(0, 1)).toBe('unchanged');
  });
});
