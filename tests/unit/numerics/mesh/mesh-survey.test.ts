import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createCoordinateSample } from '@/lib/numerics/mesh/coordinate-sample';
import { flatAxes } from '@/lib/numerics/mesh/flat-axes';
import { createMeshTotal } from '@/lib/numerics/mesh/mesh-total';
import { edges, surveyOf, surveyParts, tensorCells } from '../../../support/mesh';

function duplicatesOf(...columns: number[][]): { rows: number; oneIn: number } {
  const sample = createCoordinateSample();
  sample.add(columns[0]?.length ?? 0, columns.map((column) => Float64Array.from(column)));
  return sample.duplicates();
}

describe('createCoordinateSample()', () => {
  it('finds every row with the coordinates of an earlier one, −0 and 0 being one', () => {
    expect(duplicatesOf([1, 2, 1, 0, -0, 1], [5, 5, 5, 0, 0, 6])).toEqual({ rows: 2, oneIn: 1 });
    expect(duplicatesOf([1, 2, 3])).toEqual({ rows: 0, oneIn: 1 });
    expect(duplicatesOf([1, 2], [2, 1])).toEqual({ rows: 0, oneIn: 1 });
  });

  it('tells the points of grids apart, up to 16 384 of them', () => {
    for (const scale of [1, 2 ** -10, 0.1, 1e-3, Math.PI, 1e8]) {
      const line = Array.from({ length: 2 ** 14 }, (_, i) => i * scale);
      expect([scale, duplicatesOf(line)]).toEqual([scale, { rows: 0, oneIn: 1 }]);
      const plane = Array.from({ length: 2 ** 14 }, (_, i) => [(i % 128) * scale, Math.floor(i / 128) * scale]);
      expect([scale, duplicatesOf(plane.map(([x = 0]) => x), plane.map(([, y = 0]) => y))]).toEqual([scale, { rows: 0, oneIn: 1 }]);
      const space = Array.from({ length: 25 ** 3 }, (_, i) => [(i % 25) * scale, (Math.floor(i / 25) % 25) * scale, Math.floor(i / 625) * scale - 3]);
      expect([scale, duplicatesOf(...[0, 1, 2].map((axis) => space.map((point) => point[axis] ?? 0)))]).toEqual([scale, { rows: 0, oneIn: 1 }]);
    }
  });

  it('estimates from part of the rows where there are more, whatever their order', () => {
    const rows = 600_000;
    const x = Float64Array.from({ length: rows }, (_, i) => (i < 60_000 ? i + 300_000 : i) / 7);
    const forward = createCoordinateSample();
    forward.add(rows, [x]);
    const { rows: found, oneIn } = forward.duplicates();
    expect(oneIn).toBe(64);
    // 60 000 twins, of which one in 64 is looked at: a standard error of 3.3 %.
    expect(Math.abs(found - 60_000)).toBeLessThan(4 * 2000);
    const parts = [x.slice(0, 1000), x.slice(1000, 250_000), x.slice(250_000)].map((some) => {
      const sample = createCoordinateSample();
      sample.add(some.length, [some]);
      return sample.takePart();
    });
    const combined = createCoordinateSample();
    for (const part of parts.reverse()) combined.addPart(part);
    expect(combined.duplicates()).toEqual({ rows: found, oneIn });
    const kept = combined.takePart().hashes.toSorted();
    expect(kept).toEqual(forward.takePart().hashes.toSorted());
    expect(kept.length).toBeLessThanOrEqual(2 ** 14);
    // One that gathers part after part drops early what would be dropped in the end.
    const [onward, total] = [createCoordinateSample(), createCoordinateSample()];
    for (let from = 0; from < rows; from += 1500) {
      onward.add(1500, [x.subarray(from, from + 1500)]);
      total.addPart(onward.takePart());
    }
    expect(onward.takePart().level).toBe(6);
    expect(total.takePart().hashes.toSorted()).toEqual(kept);
  });
});

describe('a survey of a mesh', () => {
  it('counts every row in a bin and keeps the mean of log2 V, whatever the chunks', () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 3 }), fc.double({ min: -1e3, max: 1e3, noNaN: true }), fc.double({ min: 1e-3, max: 1e3, noNaN: true }), fc.integer({ min: 1, max: 7 }), (dimension, origin, length, chunks) => {
      const cells = tensorCells(...Array.from({ length: dimension }, (_, axis) => edges(9 - axis, (s) => origin * axis + length * s * s)));
      const survey = surveyOf(cells, chunks);
      expect(survey.sizes?.counts.reduce((sum, count) => sum + count, 0)).toBe(cells.centres.length);
      const mean = cells.volumes.reduce((sum, volume) => sum + Math.log2(volume), 0) / cells.volumes.length;
      const found = survey.sizes?.counts.reduce((sum, count, at) => sum + count * (survey.sizes?.logs[at] ?? 0), 0) ?? NaN;
      expect(found / cells.volumes.length).toBeCloseTo(mean, 3);
      // Each centre lies in the bin that counts it.
      const raster = survey.sizes;
      const bins = new Map<string, number>();
      for (const centre of cells.centres) {
        const key = centre.map((at, axis) => Math.floor(at / 2 ** (raster?.exponents[axis] ?? 0))).join(' ');
        bins.set(key, (bins.get(key) ?? 0) + 1);
      }
      expect(new Map(raster?.counts.map((count, at) => [raster.indices.map((indices) => indices[at]).join(' '), count]))).toEqual(bins);
      expect(surveyOf(cells, 1)).toEqual(survey);
    }), { numRuns: 60 });
  });

  it('has bounds, no sizes without weights, and nothing of no rows', () => {
    const cells = tensorCells(edges(4), edges(2), [0, 0.5]);
    expect(surveyOf(cells)).toMatchObject({ low: [0.125, 0.25, 0.25], high: [0.875, 0.75, 0.25], duplicates: { rows: 0, oneIn: 1 } });
    const total = createMeshTotal();
    expect(total.finish()).toBeNull();
    for (const { part, rows } of surveyParts(cells, 1, false)) total.add(part, rows);
    expect(total.finish()).not.toHaveProperty('sizes');
  });

  it('takes coordinates that span all doubles', () => {
    const centres = [[-1e308], [1e-300], [1e308], [0]];
    expect(surveyOf({ centres, volumes: [1, 1, 1, 1] }).sizes?.counts.reduce((sum, count) => sum + count, 0)).toBe(4);
  });
});

describe('flatAxes(survey)', () => {
  it('names directions along which all rows lie at one coordinate, to rounding', () => {
    expect(flatAxes({ low: [0, 0, 0.05], high: [1, 2, 0.05 + 1e-17] })).toEqual([2]);
    expect(flatAxes({ low: [0, 3], high: [1, 3] })).toEqual([1]);
    expect(flatAxes({ low: [0, 0], high: [1, 1] })).toEqual([]);
    expect(flatAxes({ low: [1], high: [1] })).toEqual([]);
  });
});
