import { createReadStream, existsSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { judgeSimilarity, type SurveyedGrid } from '@/lib/numerics/mesh/judge-similarity';
import { readGrid } from '@/lib/readers/read-grid';
import { readSolverSet } from '../../../support/solver-set';
import { edges, surveyOf, tensorCells, type MeshCells } from '../../../support/mesh';

/** A series from cells, the finest first, with h from volume over count. */
function series(grids: readonly MeshCells[], changes: Partial<SurveyedGrid> = {}): SurveyedGrid[] {
  return grids.map((cells, index) => ({
    label: `g${index + 1}`, h: (cells.volumes.reduce((sum, volume) => sum + volume, 0) / cells.volumes.length) ** (1 / (cells.centres[0]?.length ?? 1)),
    survey: surveyOf(cells), isSized: true, counts: null, ...changes,
  })).sort((left, right) => left.h - right.h);
}
const sizes = [64, 32, 16];
/** Growth from cell to cell by g on the coarsest of 16 cells, its root on the next, and so on: a mapping that all grids share. */
const geometric = (g: number, cells = 16) => (s: number) => (g ** (cells * s) - 1) / (g ** cells - 1);
/** The same growth on every grid, however many cells: not refined alike. */
const fixedGrowth = (n: number, g: number) => edges(n, geometric(g, n));

describe('judgeSimilarity(grids)', () => {
  it('finds uniform grids similar in one, two and three dimensions, at any place and of any size', () => {
    const place = fc.record({ origin: fc.double({ min: -50, max: 50, noNaN: true }), length: fc.double({ min: 1e-3, max: 1e3, noNaN: true }), dimension: fc.integer({ min: 1, max: 3 }), coarsest: fc.integer({ min: 6, max: 12 }), ratio: fc.constantFrom(1.5, 2) });
    fc.assert(fc.property(place, ({ origin, length, dimension, coarsest, ratio }) => {
      const grids = [0, 1, 2].map((level) => tensorCells(...Array.from({ length: dimension }, () => edges(Math.round(coarsest * ratio ** level), (s) => origin + length * s))));
      const found = judgeSimilarity(series(grids));
      expect(found?.isSimilar ?? true).toBe(true);
      for (const pair of found?.pairs ?? []) expect(Math.max(pair.high ?? 1, pair.median ?? 1) - (pair.low ?? 1)).toBeLessThan(1e-3);
    }), { numRuns: 30 });
  });

  it('finds grids similar whose cells vary at random about one size', () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 1e6 }), fc.integer({ min: 2, max: 3 }), (seed, dimension) => {
      let state = seed;
      const random = () => ((state = (state * 16807) % 2147483647) / 2147483647);
      const grids = (dimension === 2 ? [64, 32, 16] : [24, 16, 10]).map((n) => {
        const cells = tensorCells(...Array.from({ length: dimension }, () => edges(n)));
        return { centres: cells.centres.map((centre) => centre.map((at) => at + ((random() - 0.5) * 0.4) / n)), volumes: cells.volumes.map((volume) => volume * (0.6 + 0.8 * random())) };
      });
      expect(judgeSimilarity(series(grids))?.isSimilar ?? true).toBe(true);
    }), { numRuns: 30 });
  });

  it('finds graded grids similar where they share a mapping, also with one cell 1.3 times the next', () => {
    for (const g of [1.05, 1.1, 1.2, 1.3, 1 / 1.2]) {
      const along = (n: number) => edges(n, geometric(g));
      expect([g, judgeSimilarity(series(sizes.map((n) => tensorCells(along(n)))))?.isSimilar ?? true]).toEqual([g, true]);
      expect([g, judgeSimilarity(series(sizes.map((n) => tensorCells(along(n), along(n)))))?.isSimilar]).toEqual([g, true]);
      expect([g, judgeSimilarity(series(sizes.map((n) => tensorCells(along(n), edges(n)))))?.isSimilar]).toEqual([g, true]);
    }
  });

  it('finds grids not similar whose cells grow alike however many there are', () => {
    for (const dimension of [1, 2]) {
      const found = judgeSimilarity(series(sizes.map((n) => tensorCells(...Array.from({ length: dimension }, () => fixedGrowth(n, 1.08))))));
      expect(found?.isSimilar).toBe(false);
      expect((found?.pairs[0]?.high ?? 0) / (found?.pairs[0]?.low ?? 1)).toBeGreaterThan(1.5);
    }
  });

  it('finds grids not similar that are refined in a part of the domain only', () => {
    // Twice as fine each time in x < 1/2, the same 16 cells beyond.
    const grids = sizes.map((n) => tensorCells([...edges(n / 2, (s) => s / 2), ...edges(8, (s) => 0.5 + s / 2).slice(1)], edges(n)));
    expect(judgeSimilarity(series(grids))).toMatchObject({ isSimilar: false, pairs: [{ coarse: 'g2', fine: 'g1', isAlike: false }, { coarse: 'g3', fine: 'g2', isAlike: false }] });
    expect(judgeSimilarity(series([grids[0], grids[1]].flatMap((grid) => grid ?? [])))?.isSimilar).toBe(true);
  });

  it('finds grids not similar that are refined in one direction only, from counts or from sizes', () => {
    const counts = [[64, 8], [32, 8], [16, 8]];
    const grids = counts.map(([n = 1, m = 1], index) => ({ label: `g${index}`, h: 1 / Math.sqrt(n * m), survey: null, isSized: false, counts: [n, m] }));
    expect(judgeSimilarity(grids)).toMatchObject({ isSimilar: false, pairs: [{ directions: [2, 1], median: null }, { directions: [2, 1] }] });
    const extents = grids.map((grid, index) => ({ ...grid, counts: null, survey: { low: [0, 0], high: [1, 1], duplicates: { rows: 0, oneIn: 1 }, extents: counts[index]?.map((n) => 1 / n) } }));
    expect(judgeSimilarity(extents)?.isSimilar).toBe(false);
    expect(judgeSimilarity(grids.map((grid, index) => ({ ...grid, counts: [2 ** (6 - index), 3 * 2 ** (5 - index)] })))?.isSimilar).toBe(true);
  });

  it('leaves a direction out that is one cell thick', () => {
    const counts = sizes.map((n, index) => ({ label: `g${index}`, h: 1 / n, survey: null, isSized: false, counts: [n, n, 1] }));
    expect(judgeSimilarity(counts)).toMatchObject({ isSimilar: true, pairs: [{ directions: [2, 2] }, { directions: [2, 2] }] });
    const found = judgeSimilarity(series(sizes.map((n) => tensorCells(edges(n), edges(n), [0, 0.1]))));
    expect(found?.pairs[0]?.median).toBeCloseTo(2, 4);
    expect(found?.isSimilar).toBe(true);
  });

  it('does not change when rows are permuted, or coordinates and volumes are scaled', () => {
    fc.assert(fc.property(fc.double({ min: 0.7, max: 2.5, noNaN: true }), fc.integer({ min: -20, max: 20 }), fc.nat(), (power, exponent, seed) => {
      const grids = [40, 20, 10].map((n) => tensorCells(edges(n, (s) => s ** power), edges(n)));
      const found = judgeSimilarity(series(grids));
      const changed = judgeSimilarity(series(grids.map(({ centres, volumes }) => {
        const places = volumes.map((_, at) => at).sort((left, right) => Math.sin(left * (seed % 89) + left) - Math.sin(right * (seed % 89) + right));
        return { centres: places.map((at) => (centres[at] ?? []).map((x) => x * 2 ** exponent)), volumes: places.map((at) => (volumes[at] ?? 1) * 4 ** exponent) };
      })));
      expect(changed?.isSimilar).toBe(found?.isSimilar);
      found?.pairs.forEach(({ median, low, high }, at) => {
        for (const [one, other] of [[median, changed?.pairs[at]?.median], [low, changed?.pairs[at]?.low], [high, changed?.pairs[at]?.high]]) expect(other).toBeCloseTo(one ?? NaN, 3);
      });
    }), { numRuns: 25 });
  });

  it('is null where weights are not volumes and no directions are known', () => {
    expect(judgeSimilarity(series(sizes.map((n) => tensorCells(edges(n))), { isSized: false }))).toBeNull();
    expect(judgeSimilarity([])).toBeNull();
  });

  it.each(['C1_tgv_grid', 'D1_laplace_orthogonal', 'D2_laplace_nonorth_corrected', 'D3_laplace_nonorth_uncorrected'])('finds the cells of %s similar', async (id) => {
    const { meta } = readSolverSet(id);
    const grids = await Promise.all(meta.grids.slice(-3).map(async ({ file, n }) => {
      const plain = `fixtures/solver-output/${id}/${file}`;
      const { norms } = await readGrid(createReadStream(existsSync(plain) ? plain : `${plain}.gz`), {
        mapping: { x: 'x', y: 'y', weight: meta.weight, fields: {} }, problem: { dimension: 2, constants: {}, exact: {} }, fields: [], mesh: { sizes: true },
      });
      return { label: file, h: 1 / n, survey: norms.mesh ?? null, isSized: true, counts: null };
    }));
    const found = judgeSimilarity(grids.reverse());
    expect(found?.isSimilar).toBe(true);
    expect(found?.pairs).toHaveLength(2);
    for (const pair of found?.pairs ?? []) expect(pair.isAlike).toBe(true);
  });
});
