import { describe, expect, it } from 'vitest';
import { noteSpacing } from '@/lib/numerics/spacing/note-spacing';
import { resolveSpacing } from '@/lib/numerics/spacing/resolve-spacing';

function spacings(request: Parameters<typeof resolveSpacing>[0]) {
  const result = resolveSpacing(request);
  return result.ok ? result.grids.map(({ label, h, basis }) => ({ label, h, basis })) : result.problems.map(({ code, label }) => ({ code, label }));
}

describe('resolveSpacing', () => {
  it('takes h as stated and sorts the finest first', () => {
    expect(spacings({ grids: [{ label: 'coarse', h: 0.5 }, { label: 'fine', h: 0.25, cells: 16 }], dimension: 2 })).toEqual([
      { label: 'fine', h: 0.25, basis: 'h' }, { label: 'coarse', h: 0.5, basis: 'h' },
    ]);
  });

  it('reads cells as a total, (V/N)^(1/D), with V = 1 where unknown', () => {
    expect(spacings({ grids: [{ label: 'a', cells: 64 }, { label: 'b', cells: 8 }], dimension: 3 })).toEqual([
      { label: 'a', h: 0.25, basis: 'cells' }, { label: 'b', h: 0.5, basis: 'cells' },
    ]);
    expect(spacings({ grids: [{ label: 'a', cells: 100 }], dimension: 2, volume: 4 })).toEqual([{ label: 'a', h: 0.2, basis: 'cells' }]);
  });

  it('reads cells per direction as 1/n, so that they and their total agree', () => {
    expect(spacings({ grids: [{ label: 'a', cellsPerDirection: 8 }, { label: 'b', cellsPerDirection: 4 }] })).toEqual([
      { label: 'a', h: 0.125, basis: 'cells-per-direction' }, { label: 'b', h: 0.25, basis: 'cells-per-direction' },
    ]);
    expect(spacings({ grids: [{ label: 'a', cellsPerDirection: 10 }], dimension: 2, volume: 4 })).toEqual([{ label: 'a', h: 0.2, basis: 'cells-per-direction' }]);
  });

  it('falls back on the sum of weights over the rows', () => {
    expect(spacings({ grids: [{ label: 'a', weightSum: 4, rows: 100, h: null, cells: null }], dimension: 2 })).toEqual([{ label: 'a', h: 0.2, basis: 'weights' }]);
  });

  it('takes the time step where the study is refined in time', () => {
    expect(spacings({ grids: [{ label: 'a', h: 1, dt: 0.1 }, { label: 'b', h: 1, dt: 0.05 }], refinement: 'time' })).toEqual([
      { label: 'b', h: 0.05, basis: 'time-step' }, { label: 'a', h: 0.1, basis: 'time-step' },
    ]);
    expect(spacings({ grids: [{ label: 'a', h: 1 }], refinement: 'time' })).toEqual([{ code: 'spacing-missing', label: 'a' }]);
  });

  it('returns a problem for each grid that tells nothing, needs a dimension or is not positive', () => {
    expect(spacings({ grids: [{ label: 'a' }, { label: 'b', cells: 10 }, { label: 'c', h: -1 }, { label: 'd', cells: Number.NaN }] })).toEqual([
      { code: 'spacing-missing', label: 'a' }, { code: 'dimension-missing', label: 'b' }, { code: 'not-positive', label: 'c' }, { code: 'not-positive', label: 'd' },
    ]);
  });

  it('returns a problem where lengths stand beside bare counts, unless the volume is known', () => {
    const grids = [{ label: 'a', h: 0.1 }, { label: 'b', cells: 25 }];
    expect(spacings({ grids, dimension: 2 })).toEqual([{ code: 'mixed-bases', label: 'b' }]);
    expect(spacings({ grids, dimension: 2, volume: 1 })).toEqual([{ label: 'a', h: 0.1, basis: 'h' }, { label: 'b', h: 0.2, basis: 'cells' }]);
  });

  it('returns a problem for two grids of one spacing, and for a finer grid with fewer cells', () => {
    expect(spacings({ grids: [{ label: 'a', cells: 16 }, { label: 'b', cells: 16 }], dimension: 2 })).toEqual([{ code: 'same-spacing', label: 'b' }]);
    expect(spacings({ grids: [{ label: 'a', h: 0.1, cells: 16 }, { label: 'b', h: 0.2, cells: 64 }], dimension: 2 })).toEqual([{ code: 'order-contradicts', label: 'a' }]);
  });
});

describe('noteSpacing(grids)', () => {
  it('notes rows that are not the cells, and sums of weights that differ by more than 1e-6', () => {
    const grids = [{ label: 'a', cells: 64, rows: 81, weightSum: 1 }, { label: 'b', cells: 16, rows: 16, weightSum: 1.00001 }, { label: 'c', cells: 4, weightSum: 1 + 1e-7 }];
    expect(noteSpacing(grids)).toEqual([
      { code: 'rows-differ-from-cells', label: 'a', found: 81, expected: 64 },
      { code: 'weights-differ', label: 'b', found: 1.00001, expected: 1 },
    ]);
  });
});
