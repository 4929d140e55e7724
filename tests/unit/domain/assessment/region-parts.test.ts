import { describe, expect, it } from 'vitest';
import { lowerAtBoundary, regionRows } from '@/lib/domain/assessment/region-parts';
import type { FieldAssessment, Region } from '@/lib/numerics/assessment';
import { fieldAssessment } from '@/tests/unit/figures/field-assessment';

const falling = (order: number) => [1, 2, 4, 8].map((step) => 1e-4 * step ** order);
const part = (region: Region, order: number, field = 'u'): FieldAssessment => ({ ...fieldAssessment({ field, errors: falling(order) }), region, outcome: null, counts: false });

describe('regionRows(fields)', () => {
  it('puts the two parts of each field and norm together, and leaves out what has none', () => {
    const fields = [part('all', 2), part('interior-2h', 2), part('boundary-2h', 1), part('all', 2, 'v'), part('boundary-fixed', 1, 'v')];
    expect(regionRows(fields)).toEqual([{ whole: fields[0], pairs: [{ band: '2h', interior: fields[1], boundary: fields[2] }] }]);
    expect(regionRows([part('all', 2)])).toEqual([]);
  });
});

describe('lowerAtBoundary(whole, pair)', () => {
  const pair = (boundary: number) => ({ band: '2h' as const, interior: part('interior-2h', 2), boundary: part('boundary-2h', boundary) });
  it('is the two orders where the boundary falls behind by more than the tolerance', () => {
    const found = lowerAtBoundary(part('all', 2), pair(1));
    expect(found?.interior).toBeCloseTo(2, 12);
    expect(found?.boundary).toBeCloseTo(1, 12);
    expect(lowerAtBoundary(part('all', 2), pair(1.95))).toBeNull();
    expect(lowerAtBoundary(part('all', 2), pair(1.85))).not.toBeNull();
    expect(lowerAtBoundary({ ...part('all', 2), tolerance: null }, pair(1.85))).toBeNull();
    expect(lowerAtBoundary(part('all', 2), pair(2.5))).toBeNull();
    const higher = { band: '2h' as const, interior: part('interior-2h', 3), boundary: part('boundary-2h', 2.2) };
    expect(lowerAtBoundary({ ...part('all', 2), formalOrder: 2 }, higher)).toBeNull();
    expect(lowerAtBoundary({ ...part('all', 2), formalOrder: null }, higher)).not.toBeNull();
  });
});
