import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { assessSeries } from '@/lib/numerics/assess-series';
import { procedures, type QuantityAssessment } from '@/lib/numerics/assessment';
import { judgeErrorSeries } from '@/lib/numerics/outcome/judge-error-series';
import { judgeQuantity } from '@/lib/numerics/outcome/judge-quantity';
import { readGrid } from '@/lib/readers/read-grid';
import { byteSource } from '../../support/byte-source';
import { errorSeries, quantitySeries } from '../../support/series';

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const anyProcedure = fc.constantFrom(...procedures);
/** Spacings at ratios between 1.3 and 3, the finest first. */
const anySpacings = fc.array(number(1.3, 3), { minLength: 3, maxLength: 6 }).map((ratios) => ratios.reduce<number[]>((h, ratio) => [...h, (h.at(-1) ?? 1) * ratio], [1]));
const smooth = fc.record({ h: anySpacings, order: number(0.6, 3.5), alpha: number(0.001, 0.05), sign: fc.constantFrom(-1, 1) });
const power = ({ h, order, alpha, sign }: { h: readonly number[]; order: number; alpha: number; sign: number }) => h.map((spacing) => 10 + sign * alpha * spacing ** order);

const close = (found: number | null | undefined, expected: number | null | undefined, tolerance: number) => {
  if (found === null || found === undefined || expected === null || expected === undefined) expect(found ?? null).toBe(expected ?? null);
  else expect(Math.abs(found - expected)).toBeLessThanOrEqual(tolerance * Math.max(1, Math.abs(expected)));
};
const bandOf = ({ gciAbsolute, uncertainty = null }: QuantityAssessment) => gciAbsolute ?? uncertainty;

/** Every number of an answer, with its path. */
function numbersOf(value: unknown, path = ''): [string, number][] {
  if (typeof value === 'number') return [[path, value]];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([name, member]) => numbersOf(member, `${path}.${name}`));
}

describe('a quantity, by every procedure', () => {
  it('keeps orders and band when every h is scaled', () => {
    fc.assert(fc.property(smooth, anyProcedure, fc.integer({ min: -20, max: 20 }), (values, procedure, exponent) => {
      const judge = (factor: number) => judgeQuantity(quantitySeries(values.h.map((h) => h * factor), power(values), { procedure, formalOrder: 2 }));
      const [found, scaled] = [judge(1), judge(2 ** exponent)];
      close(scaled.orderObserved, found.orderObserved, 1e-6);
      close(scaled.extrapolated, found.extrapolated, 1e-6);
      close(bandOf(scaled), bandOf(found), 1e-5);
    }), { numRuns: 60 });
  });

  it('scales its band with φ, moves its extrapolated value with φ, and keeps orders', () => {
    fc.assert(fc.property(smooth, anyProcedure, fc.constantFrom(-4, -1, 0.5, 8), number(-3, 3), (values, procedure, factor, shift) => {
      const judge = (change: (value: number) => number) => judgeQuantity(quantitySeries(values.h, power(values).map(change), { procedure, formalOrder: 2 }));
      const [found, changed] = [judge((value) => value), judge((value) => factor * value + shift)];
      close(changed.orderObserved, found.orderObserved, 1e-5);
      close(changed.extrapolated, found.extrapolated === null ? null : factor * found.extrapolated + shift, 1e-5);
      close(bandOf(changed), bandOf(found) === null ? null : Math.abs(factor) * (bandOf(found) ?? 0), 1e-4);
    }), { numRuns: 60 });
  });

  it('keeps everything when the grids come in another order', () => {
    fc.assert(fc.property(smooth, anyProcedure, (values, procedure) => {
      const series = quantitySeries(values.h, power(values), { procedure, formalOrder: 2, target: 0.01 });
      expect(assessSeries({ errors: [], quantities: [{ ...series, grids: series.grids.toReversed() }] })).toEqual(assessSeries({ errors: [], quantities: [series] }));
    }), { numRuns: 40 });
  });

  it('answers numbers that are finite, or null, whatever the values', () => {
    const wild = fc.array(fc.oneof(number(-1e6, 1e6), fc.constantFrom(0, 1, 1, 1e-300, -1e300, 1e100)), { minLength: 2, maxLength: 7 });
    fc.assert(fc.property(wild, anyProcedure, (list, procedure) => {
      const bounded = list.map((value) => Math.max(-1e100, Math.min(1e100, value)));
      const found = assessSeries({ errors: [], quantities: [quantitySeries(list.map((_, i) => 1.5 ** i), bounded, { procedure, formalOrder: 2, target: 0.01, uNumFactor: 1.15 })] });
      for (const [path, value] of numbersOf(found)) expect([path, Number.isFinite(value)]).toEqual([path, true]);
    }), { numRuns: 300 });
  });
});

describe('errors', () => {
  it('E = Σ a_k h^k shows the lowest k as h → 0', () => {
    const terms = fc.uniqueArray(fc.record({ k: fc.integer({ min: 1, max: 6 }), a: number(0.2, 5) }), { selector: ({ k }) => k, minLength: 1, maxLength: 4 });
    fc.assert(fc.property(terms, (parts) => {
      const h = Array.from({ length: 10 }, (_, i) => 2 ** -(i + 4));
      const errors = h.map((spacing) => parts.reduce((sum, { k, a }) => sum + a * spacing ** k, 0));
      const lowest = Math.min(...parts.map(({ k }) => k));
      const found = judgeErrorSeries(errorSeries(h, errors, { formalOrder: lowest, scale: 2 ** -200 }));
      expect(Math.abs((found.orders[0]?.order ?? 0) - lowest)).toBeLessThan(0.02);
      const gaps = found.orders.map(({ order }) => Math.abs((order ?? 0) - lowest));
      expect(gaps[0]).toBeLessThanOrEqual((gaps[2] ?? 0) + 1e-9);
    }));
  });

  it('answer numbers that are finite, or null, whatever the errors', () => {
    const wild = fc.array(fc.oneof(number(0, 1e6), fc.constantFrom(0, 1e-320, 1e300)), { minLength: 1, maxLength: 7 });
    fc.assert(fc.property(wild, (list) => {
      const found = assessSeries({ errors: [errorSeries(list.map((_, i) => 1.5 ** i), list, { formalOrder: 2 })], quantities: [] });
      for (const [path, value] of numbersOf(found)) expect([path, Number.isFinite(value)]).toEqual([path, true]);
    }), { numRuns: 300 });
  });
});

describe('norms of a file', () => {
  const anyRows = fc.array(fc.record({ x: number(0, 1), w: number(0.1, 2), u: number(-2, 2) }), { minLength: 1, maxLength: 30 });
  const normsOf = async (rows: readonly { x: number; w: number; u: number }[]) => {
    const text = ['x,w,u', ...rows.map(({ x, w, u }) => [x, w, u].join(','))].join('\n');
    const reading = { mapping: { x: 'x', weight: 'w', fields: { u: 'u' } }, problem: { dimension: 1 as const, exact: { u: 'sin(x)' }, constants: {} }, fields: [{ field: 'u' }] };
    return (await readGrid(byteSource(text), reading)).norms.fields[0];
  };
  const same = (found: Awaited<ReturnType<typeof normsOf>>, expected: Awaited<ReturnType<typeof normsOf>>) => {
    for (const norm of ['L1', 'L2', 'Linf', 'mean'] as const) expect(Math.abs((found?.[norm] ?? 0) - (expected?.[norm] ?? 1))).toBeLessThan(1e-13);
  };

  it('do not change when rows are permuted, or a row is split into two of half its weight', async () => {
    await fc.assert(fc.asyncProperty(anyRows, fc.nat(), async (rows, seed) => {
      const expected = await normsOf(rows);
      same(await normsOf([...rows].sort((left, right) => Math.sin(left.x * (seed % 97)) - Math.sin(right.x * (seed % 97)))), expected);
      const at = seed % rows.length;
      same(await normsOf(rows.flatMap((row, i) => (i === at ? [{ ...row, w: row.w / 2 }, { ...row, w: row.w / 2 }] : [row]))), expected);
    }), { numRuns: 40 });
  });
});
