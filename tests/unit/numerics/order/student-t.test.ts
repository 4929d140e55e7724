import { describe, expect, it } from 'vitest';
import { studentT } from '@/lib/numerics/order/student-t';

// NIST/SEMATECH e-Handbook of Statistical Methods, 1.3.6.7.2, upper critical values of Student's t distribution.
const table: [freedom: number, p95: number, p975: number, p99: number][] = [
  [1, 6.314, 12.706, 31.821], [2, 2.92, 4.303, 6.965], [3, 2.353, 3.182, 4.541], [4, 2.132, 2.776, 3.747], [5, 2.015, 2.571, 3.365],
  [6, 1.943, 2.447, 3.143], [7, 1.895, 2.365, 2.998], [8, 1.86, 2.306, 2.896], [9, 1.833, 2.262, 2.821], [10, 1.812, 2.228, 2.764],
  [12, 1.782, 2.179, 2.681], [15, 1.753, 2.131, 2.602], [20, 1.725, 2.086, 2.528], [30, 1.697, 2.042, 2.457], [60, 1.671, 2, 2.39],
  [100, 1.66, 1.984, 2.364],
];

describe('studentT(p, freedom)', () => {
  it.each(table)('equals the table at %i degrees of freedom', (freedom, p95, p975, p99) => {
    expect(studentT(0.95, freedom)).toBeCloseTo(p95, 3);
    expect(studentT(0.975, freedom)).toBeCloseTo(p975, 3);
    expect(studentT(0.99, freedom)).toBeCloseTo(p99, 3);
  });

  it('equals the closed forms tan(π(p − ½)) at 1 and (2p − 1)√(2/(1 − (2p − 1)²)) at 2 degrees of freedom', () => {
    expect(studentT(0.975, 1)).toBeCloseTo(Math.tan(Math.PI * 0.475), 9);
    expect(studentT(0.975, 2)).toBeCloseTo(0.95 * Math.sqrt(2 / (1 - 0.95 ** 2)), 12);
  });

  it('is 0 at the median', () => expect(studentT(0.5, 7)).toBeCloseTo(0, 12));

  it('throws for a p or a freedom out of range, naming it', () => {
    expect(() => studentT(1, 4)).toThrow('p must lie in [0.5, 1), got 1');
    expect(() => studentT(0.975, 0)).toThrow('freedom must be a whole number above 0, got 0');
  });
});
