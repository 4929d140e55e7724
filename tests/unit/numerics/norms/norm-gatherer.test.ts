import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createNormTotal } from '@/lib/numerics/norms/combine-norms';
import { createNormGatherer } from '@/lib/numerics/norms/norm-gatherer';

interface Rows { x: number[]; q: number[]; exact: number[]; w?: number[] }

function gather({ x, q, exact, w }: Rows, blocks = [x.length]) {
  const gatherer = createNormGatherer(['u']);
  let from = 0;
  for (const rows of blocks) {
    const cut = (values: number[]) => Float64Array.from(values.slice(from, from + rows));
    gatherer.add({ rows, x: cut(x), y: null, z: null, weights: w ? cut(w) : null, fields: [{ values: cut(q), exact: cut(exact) }] });
    from += rows;
  }
  const total = createNormTotal(['u']);
  total.add(gatherer.part());
  return { gatherer, norms: gatherer.problems().length > 0 ? null : total.finish([3]) };
}

describe('createNormGatherer(fields)', () => {
  it('gives L1, L2 and L∞ with its place, the signed mean and the exact norms, by weight', () => {
    const { norms } = gather({ x: [0, 1, 2], q: [1, 1, 5], exact: [0, 2, 2], w: [1, 2, 1] });
    expect(norms).toEqual({
      rows: 3, weightSum: 4, equalWeights: false,
      fields: [{
        field: 'u', L1: (1 + 2 + 3) / 4, L2: Math.sqrt((1 + 2 + 9) / 4), Linf: 3, at: { x: 2 }, mean: (1 - 2 + 3) / 4,
        exact: { L1: (0 + 4 + 2) / 4, L2: Math.sqrt((0 + 8 + 4) / 4), Linf: 2 }, min: 1, max: 5, maxAbs: 5, count: 3, significantDigits: 3,
      }],
    });
  });

  it('weighs every row by one where there are no weights', () => {
    expect(gather({ x: [0, 1], q: [1, -3], exact: [0, 0] }).norms).toMatchObject({ weightSum: 2, equalWeights: true, fields: [{ L1: 2, mean: -1, maxAbs: 3 }] });
  });

  it('gives the first place where several errors are the largest, and zero with a place for no error', () => {
    expect(gather({ x: [7, 8], q: [1, 1], exact: [0, 2] }).norms?.fields[0]?.at).toEqual({ x: 7 });
    expect(gather({ x: [7, 8], q: [1, 2], exact: [1, 2] }).norms?.fields[0]).toMatchObject({ Linf: 0, L1: 0, at: { x: 7 } });
  });

  it('is the same however the rows come in blocks', () => {
    const q = Array.from({ length: 1000 }, (_, i) => Math.sin(i) * 1e3);
    const rows = { x: q.map((_, i) => i), q, exact: q.map((value) => value * 0.99), w: q.map((_, i) => 1 + (i % 7)) };
    const whole = gather(rows).norms!;
    fc.assert(fc.property(fc.integer({ min: 1, max: 999 }), (cut) => {
      const parts = gather(rows, [cut, 1000 - cut]).norms!;
      expect(parts.fields[0]!.L2 / whole.fields[0]!.L2).toBeCloseTo(1, 15);
      expect(parts.fields[0]!.at).toEqual(whole.fields[0]!.at);
    }), { numRuns: 50 });
  });

  it('reports weights that are not positive and values without a norm, with the first row and the count', () => {
    const { gatherer, norms } = gather({ x: [0, 1, 2, 3], q: [0, NaN, 0, 1e200], exact: [0, 0, Infinity, 0], w: [1, 0, -1, NaN] }, [1, 3]);
    expect(norms).toBeNull();
    expect(gatherer.problems()).toEqual([
      { code: 'weight-not-positive', field: null, count: 3, row: 1, value: 0 },
      { code: 'value-not-finite', field: 'u', count: 1, row: 1, value: NaN },
      { code: 'exact-not-finite', field: 'u', count: 1, row: 2, value: Infinity },
    ]);
    expect(gather({ x: [0], q: [1e200], exact: [0] }).gatherer.problems()).toEqual([{ code: 'value-not-finite', field: 'u', count: 1, row: 0, value: 1e200 }]);
  });

  it('reports values whose squares would add up beyond a double, rather than an infinite norm', () => {
    const large = Array.from({ length: 300 }, () => 1e154);
    const { gatherer, norms } = gather({ x: large, q: large, exact: large.map(() => 0) });
    expect(norms).toBeNull();
    expect(gatherer.problems()).toEqual([{ code: 'value-not-finite', field: 'u', count: 300, row: 0, value: 1e154 }]);
    expect(gather({ x: large, q: large.map(() => 1e140), exact: large.map(() => 0) }).norms?.fields[0]?.L2).toBeCloseTo(1e140, -127);
  });

  it('reports finite weights so large that their products have no sum', () => {
    const { gatherer, norms } = gather({ x: [0, 1, 2], q: [0, 1, 1e-9], exact: [0, 0, 0], w: [1, 1e300, 1e308] });
    expect(norms).toBeNull();
    expect(gatherer.problems()).toEqual([{ code: 'weight-not-positive', field: null, count: 2, row: 1, value: 1e300 }]);
  });

  it('has a finite norm of large errors with weights of almost nothing', () => {
    const { norms } = gather({ x: [0, 1], q: [1e200, 1e200], exact: [0, 0], w: [1e-310, 1e-310] });
    expect((norms?.fields[0]?.L2 ?? 0) / 1e200).toBeCloseTo(1, 12);
  });

  it('has no norms without rows', () => expect(createNormTotal(['u']).finish([null])).toBeNull());
});
