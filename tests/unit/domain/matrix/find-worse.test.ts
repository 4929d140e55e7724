import { describe, expect, it } from 'vitest';
import { findWorse } from '@/lib/domain/matrix/find-worse';
import type { ErrorSeries } from '@/lib/numerics/assessment';
import { assessmentOf } from '../../../support/assessments';
import { errorSeries } from '../../../support/series';

const h = [1 / 8, 1 / 16, 1 / 32, 1 / 64];
const series = (factor: number, order = 2, changes: Partial<ErrorSeries> = {}) => errorSeries(h, h.map((spacing) => factor * spacing ** order), changes);
const compare = (before: ErrorSeries[], after: ErrorSeries[]) => findWorse(
  { slug: 'layer', name: 'Layer' }, { release: '1.0', assessment: assessmentOf(before) }, { release: '1.1', assessment: assessmentOf(after) },
);

describe('findWorse', () => {
  it('finds nothing where errors are the same within 5 %', () => expect(compare([series(1)], [series(1.04)])).toEqual([]));
  it('finds an error grown at equal order', () => {
    const [found] = compare([series(1)], [series(1.2)]);
    expect(found).toMatchObject({ case: 'layer', caseName: 'Layer', field: 'u', norm: 'L2', h: 1 / 64 });
    expect(found?.ratio).toBeCloseTo(1.2, 12);
  });
  it('finds an order fallen where the error has not grown yet', () => {
    // 0.5·h^1.9 is below h² down to h = 2^-10.
    const [found] = compare([series(1)], [series(0.5, 1.9)]);
    expect(found?.ratio).toBeLessThan(1);
    expect(found?.orderBefore).toBeCloseTo(2, 9);
    expect(found?.orderAfter).toBeCloseTo(1.9, 9);
  });
  it('names the norm that lost most, once for each field', () => {
    const max = { norm: 'Linf' as const };
    const found = compare([series(1), series(1, 2, max), series(1, 2, { field: 'v' })], [series(1.2), series(1.5, 2, max), series(1.3, 2, { field: 'v' })]);
    expect(found.map((each) => [each.field, each.norm])).toEqual([['u', 'Linf'], ['v', 'L2']]);
  });
  it('leaves out norms that do not count', () => expect(compare([series(1)], [series(1), series(9, 2, { norm: 'L1', counts: false })])).toEqual([]));
  it('compares nothing without a spacing that both have', () => {
    const others = [1 / 9, 1 / 18, 1 / 36, 1 / 72];
    expect(compare([series(1)], [errorSeries(others, others.map((spacing) => 9 * spacing ** 2))])).toEqual([]);
  });
});
