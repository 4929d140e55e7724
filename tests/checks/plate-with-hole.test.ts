import { describe, expect, it } from 'vitest';
import { judgeQuantity } from '@/lib/numerics/outcome/judge-quantity';
import { quantitySeries } from '../support/series';
import { readReference } from './reference';

interface Triplet { grids: [number, number, number]; convergence: string; order: number | null; range: [number, number]; extrapolated: number; gci: number; gciCoarse: number }
interface Series { set: string; quantity: string; h: number[]; values: number[]; triplets: Triplet[] }

// Values of a real solver (CalculiX, quarter plate with a hole) and triplets from an independent script.
const { series } = readReference<{ series: Series[] }>('plate-with-hole.json');
const types: Record<string, string> = {
  'monotonic convergence': 'monotone', 'monotonic divergence': 'divergent',
  'oscillatory convergence': 'oscillatory', 'oscillatory divergence': 'oscillatory-divergent',
};
const relative = (found: number | null, expected: number) => Math.abs((found ?? Number.NaN) / expected - 1);

function pick(from: readonly number[], grids: readonly number[]): number[] {
  return grids.map((grid) => from[grid - 1] ?? Number.NaN).reverse();
}

describe.each(series)('$quantity of $set', ({ h, values, triplets }) => {
  it.each(triplets)('grids $grids: $convergence', ({ grids, convergence, order, range, extrapolated, gci, gciCoarse }) => {
    const found = judgeQuantity(quantitySeries(pick(h, grids), pick(values, grids)));
    expect(found.convergence).toBe(types[convergence]);
    if (convergence !== 'monotonic convergence') {
      expect(found).toMatchObject({ gci: null, extrapolated: null });
      return;
    }
    expect(found.orderObserved).toBeCloseTo(order ?? Number.NaN, 9);
    expect(relative(found.extrapolated, extrapolated)).toBeLessThan(1e-9);
    expect(relative(found.gci, gci)).toBeLessThan(1e-9);
    expect(relative(found.gciCoarse, gciCoarse)).toBeLessThan(1e-9);
    expect(found.orderRange?.[0]).toBeCloseTo(range[0], 6);
    expect(found.orderRange?.[1]).toBeCloseTo(range[1], 6);
  });

  it('all five grids give the same triples', () => {
    const found = judgeQuantity(quantitySeries([...h].reverse(), [...values].reverse()));
    expect(found.triples.map((triple) => triple.convergence)).toEqual(triplets.map(({ convergence }) => types[convergence]).reverse());
  });
});
