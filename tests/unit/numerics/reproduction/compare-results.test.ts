import { describe, expect, it } from 'vitest';
import { compareResults } from '@/lib/numerics/reproduction/compare-results';

describe('compareResults(kept, again)', () => {
  it('is identical where every kept member is the same, and passes over later ones', () => {
    expect(compareResults({ a: [1, null, 'x'], z: 0 }, { a: [1, null, 'x'], z: -0, later: 2 })).toEqual({ result: 'identical', largestDifference: 0, differences: [] });
  });
  it('is within 1e-10 of the larger value, not beyond', () => {
    expect(compareResults({ a: 1e-20 }, { a: 1e-20 * (1 + 9e-11) }).result).toBe('within-1e-10');
    expect(compareResults({ a: 1 }, { a: 1 + 2e-10 })).toMatchObject({ result: 'not-reproduced', differences: [{ path: 'a', before: 1 }] });
  });
  it.each([[{ a: 'pass' }, { a: 'fail' }, 'a'], [{ a: 1 }, { a: null }, 'a'], [{ a: [1, 2] }, { a: [1] }, 'a.length'], [{ a: { b: 1 } }, {}, 'a'], [{ a: 0 }, { a: 1e-30 }, 'a']])('%j is not %j', (kept, again, path) => {
    expect(compareResults(kept, again)).toMatchObject({ result: 'not-reproduced', differences: expect.arrayContaining([expect.objectContaining({ path })]) as unknown[] });
  });
  it('names the first 20 differences', () => {
    const many = Object.fromEntries(Array.from({ length: 30 }, (_, i) => [`m${i}`, i + 1]));
    expect(compareResults(many, {}).differences).toHaveLength(20);
  });
});
