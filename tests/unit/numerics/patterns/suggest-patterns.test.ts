import { describe, expect, it } from 'vitest';
import { explainPattern } from '@/lib/domain/assessment/explain-pattern';
import { patternCodes, type Norm, type Region } from '@/lib/numerics/assessment';
import { judgeErrorSeries } from '@/lib/numerics/outcome/judge-error-series';
import { suggestPatterns, type Surroundings } from '@/lib/numerics/patterns/suggest-patterns';
import { errorSeries } from '../../../support/series';

const h = [1 / 8, 1 / 16, 1 / 32, 1 / 64, 1 / 128];
type Orders = Partial<Record<Norm, number>>;

function judged(field: string, orders: Orders, formalOrder = 2, at: { x: number } | null = null) {
  return (Object.entries(orders) as [Norm, number][]).map(([norm, order]) => {
    const series = errorSeries(h, h.map((spacing) => spacing ** order), { field, norm, formalOrder });
    return judgeErrorSeries({ ...series, grids: series.grids.map((grid) => ({ ...grid, at: norm === 'Linf' ? at : null })) });
  });
}
const codes = (fields: ReturnType<typeof judged>, around?: Surroundings) => suggestPatterns(fields, around).map(({ code, field }) => (field ? `${code} ${field}` : code));
const box = { x: [0, 1] } as const;

describe('suggestPatterns(fields, surroundings)', () => {
  it('says nothing of fields that pass', () => expect(suggestPatterns(judged('u', { L1: 2, L2: 2, Linf: 2 }))).toEqual([]));

  it.each([
    ['shock', { L1: 1, L2: 0.5, Linf: 0.02 }, 2], ['contact', { L1: 2 / 3, L2: 1 / 3, Linf: 0 }, 2], ['limiter', { L2: 5 / 3, Linf: 4 / 3 }, 2],
    ['first-order', { L1: 1, L2: 1.02, Linf: 0.97 }, 2], ['stuck-at-two', { L1: 2, L2: 2, Linf: 1.95 }, 4], ['corner', { L2: 4 / 3, H1: 2 / 3 }, 2],
  ] as const)('%s', (code, orders, formal) => expect(codes(judged('u', orders, formal))).toEqual([`${code} u`]));

  it('boundary closure only where the largest error lies at the boundary', () => {
    const orders = { L1: 2, L2: 1.5, Linf: 1 };
    expect(codes(judged('u', orders, 2, { x: 0.004 }), { box })).toEqual(['boundary-closure u']);
    expect(codes(judged('u', orders, 2, { x: 0.5 }), { box })).toEqual([]);
    expect(codes(judged('u', orders, 2, { x: 0.004 }))).toEqual([]);
  });

  it('boundary closure by a lower order along the boundary than inside, whatever the norms of the whole', () => {
    const of = (region: Region, norm: Norm, order: number, size = 1) => judgeErrorSeries(errorSeries(h, h.map((spacing) => size * spacing ** order), { field: 'u', norm, region, counts: false }));
    const whole = judged('u', { L2: 1.5 });
    const seen = [...whole, of('boundary-2h', 'L2', 1), of('interior-2h', 'L2', 2)];
    expect(suggestPatterns(seen)).toEqual([{ code: 'boundary-closure', field: 'u', evidence: { L2: expect.closeTo(1.5, 10) as number, boundaryOrder: expect.closeTo(1, 10) as number, interiorOrder: expect.closeTo(2, 10) as number } }]);
    expect(suggestPatterns(seen).map(explainPattern)[0]).toContain('order 1.00 along the boundary and 2.00 inside');
    expect(codes([...whole, of('boundary-2h', 'L2', 1), of('interior-2h', 'L2', 1.1)])).toEqual([]);
    expect(codes([...whole, of('boundary-2h', 'L2', 1, 1e-6), of('interior-2h', 'L2', 2)])).toEqual([]);
    // Orders of the whole that look like one, but the parts say otherwise.
    expect(codes([...judged('u', { L1: 2, L2: 1.5, Linf: 1 }, 2, { x: 0.004 }), of('boundary-fixed', 'L2', 1.5), of('interior-fixed', 'L2', 1.5)], { box })).toEqual([]);
  });

  it('one field that stands still among others, or all of them', () => {
    expect(codes([...judged('u', { L2: 0.02 }), ...judged('v', { L2: 2 })])).toEqual(['one-field-flat u']);
    expect(codes([...judged('u', { L2: 0.02 }), ...judged('v', { L2: 0.1 })])).toEqual(['all-flat']);
  });

  it('a datum where the error without its mean falls', () => {
    const errors = h.map((spacing) => Math.hypot(0.3, spacing ** 2));
    const fields = [judgeErrorSeries(errorSeries(h, errors, { field: 'p' }))];
    const means = fields[0]?.grids.map(({ label }) => ({ field: 'p', label, mean: 0.3 })) ?? [];
    expect(codes(fields, { means })).toEqual(['datum p']);
    expect(codes(fields, { means: means.map((each) => ({ ...each, mean: 0 })) })).toEqual(['all-flat']);
  });

  it('orders that fall under refinement, and orders that alternate', () => {
    const from = (orders: readonly number[]) => {
      let error = 1;
      return [judgeErrorSeries(errorSeries(h, [1, ...orders.map((order) => (error /= 2 ** order))]))];
    };
    expect(codes(from([2, 1.9, 1.5, 0.7]))).toEqual(['falling-order u']);
    expect(codes(from([2.4, 1.4, 2.4, 1.4]))).toEqual(['alternating u']);
    expect(codes(from([2, 2, 2, 2]))).toEqual([]);
  });

  it('every pattern has its sentence with its figures', () => {
    for (const code of patternCodes) expect(explainPattern({ code, field: 'u', evidence: {} })).toMatch(/^[A-Z].*\.$/);
    const [shock] = suggestPatterns(judged('u', { L1: 1, L2: 0.5, Linf: 0 }));
    expect(shock && explainPattern(shock)).toBe('L1, L2 and L∞ of u fall with orders 1.00, 0.50 and 0.00, as across a shock.');
  });
});
