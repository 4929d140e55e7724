import { describe, expect, it } from 'vitest';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import { checkSeries } from '@/lib/domain/studies/check-series';
import type { GridInput } from '@/lib/domain/studies/input';
import { statedSpacing } from '@/lib/domain/studies/stated-spacing';
import { filesTellSpacing, takesFiles } from '@/lib/domain/studies/takes-files';

const withField = caseDefinitionSchema.parse({ fields: [{ field: 'u', norms: [{ norm: 'L2' }] }], quantities: [{ name: 'drag' }] });
const withoutField = caseDefinitionSchema.parse({ quantities: [{ name: 'drag' }] });
const around = { definition: withField, refinement: 'space', dimension: 2, volume: null, canHaveFile: true } as const;
const paths = (grids: GridInput[], more: object = {}) => checkSeries(grids, { ...around, ...more }).map(({ path }) => path);

describe('checkSeries', () => {
  it('lets a grid without a spacing wait for the weights of its file, unless no file can come', () => {
    expect(paths([{ label: 'a' }])).toEqual([]);
    expect(paths([{ label: 'a', errors: { u: { L2: 1 } } }])).toEqual(['grids.0.h']);
    expect(paths([{ label: 'a', values: { drag: 1 } }], { definition: withoutField, canHaveFile: false })).toEqual(['grids.0.h']);
  });

  it('wants a time step of every grid of a study refined in time', () => {
    expect(paths([{ label: 'a', dt: 0.1 }, { label: 'b', h: 0.1 }], { refinement: 'time' })).toEqual(['grids.1.dt']);
  });

  it('names what the case does not declare', () => {
    const grid = { label: 'a', h: 1, values: { lift: 1 }, errors: { v: { L2: 1 }, u: { L1: 1 } }, iterativeError: { p: { L2: 1 } } };
    expect(paths([grid])).toEqual(['grids.0.values.lift', 'grids.0.errors.v', 'grids.0.errors.u.L1', 'grids.0.iterativeError.p']);
  });

  it('finds lengths beside bare counts, and a finer grid with fewer cells', () => {
    expect(paths([{ label: 'a', h: 0.1 }, { label: 'b', cells: 400 }])).toEqual(['grids.1']);
    expect(paths([{ label: 'a', h: 0.1, cells: 10 }, { label: 'b', h: 0.2, cells: 100 }])).toEqual(['grids.0']);
  });
});

describe('takesFiles', () => {
  it('wants a field', () => {
    expect(takesFiles(withField)).toBe(true);
    expect(takesFiles(withoutField)).toBe(false);
  });
});

describe('filesTellSpacing', () => {
  it('wants an exact solution: without one, solutions stand on the same points', () => {
    expect(filesTellSpacing(withField, { exact: { u: 'x' } })).toBe(true);
    expect(filesTellSpacing(withField, {})).toBe(false);
  });
});

describe('statedSpacing', () => {
  it('takes the geometric mean of counts along several directions', () => {
    expect(statedSpacing({ label: 'a', cellsPerDirection: [4, 16] }).cellsPerDirection).toBe(8);
  });

  it('takes the sum of weights only where they are sizes', () => {
    expect(statedSpacing({ label: 'a' }, { rows: 4, weightSum: 1, equalWeights: false })).toMatchObject({ rows: 4, weightSum: 1 });
    expect(statedSpacing({ label: 'a' }, { rows: 4, weightSum: 4, equalWeights: true }).weightSum).toBeUndefined();
  });
});
