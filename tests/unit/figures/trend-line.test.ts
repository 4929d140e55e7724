import { describe, expect, it } from 'vitest';
import { trendChange, trendLine, trendRange } from '@/lib/figures/trend-line';

describe('trendRange(rows)', () => {
  it('spans every row in decades, leaving out what is missing', () => {
    expect(trendRange([[1e-3, null], [1e-5, 0]])).toEqual([-5, -3]);
    expect(trendRange([[null], []])).toBeNull();
  });
});

describe('trendLine(errors, range)', () => {
  it('breaks where a release has no error and marks the last point larger', () => {
    const line = trendLine([1e-3, 1e-3, null, 1e-4, 1e-4], [-4, -3]);
    expect(line.paths).toHaveLength(2);
    expect(line.dots.map(({ r }) => r)).toEqual([1.5, 1.5, 1.5, 2.6]);
  });

  it('puts the larger error higher', () => {
    const [first, last] = trendLine([1e-3, 1e-4], [-4, -3]).dots;
    expect(first?.y).toBe(4);
    expect(last?.y).toBe(14);
  });
});

describe('trendChange(errors)', () => {
  it('is null within 0.9 to 1.1 and the factor outside', () => {
    expect(trendChange([1, 1.05])).toBeNull();
    expect(trendChange([1, null, 1.3])).toBeCloseTo(1.3, 12);
    expect(trendChange([1])).toBeNull();
  });
});
