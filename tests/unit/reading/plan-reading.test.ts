import { describe, expect, it } from 'vitest';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import { matchColumns } from '@/lib/domain/columns/match-columns';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { bestScale } from '@/lib/numerics/norms/best-scale';
import type { GridNorms } from '@/lib/numerics/norms/grid-norms';
import { readGrid } from '@/lib/readers/read-grid';
import { findDatums, planSecondReading } from '@/lib/services/reading/datums';
import { joinNorms, planReading } from '@/lib/services/reading/plan-reading';
import { byteSource } from '../../support/byte-source';

const problem = problemDefinitionSchema.parse({ equation: 'heat', dimension: 2, constants: { k: 0.5 }, exact: { T: 'sin(x)*y' } });
const n = 6;
const points = Array.from({ length: n * n }, (_, i) => ({ x: ((i % n) + 0.5) / n, y: (Math.floor(i / n) + 0.5) / n }));
const error = (x: number, y: number) => 0.01 * Math.cos(5 * x + y);
const exact = (x: number, y: number) => Math.sin(x) * y;
const root = (of: (x: number, y: number) => number) => Math.sqrt(points.reduce((sum, { x, y }) => sum + of(x, y) ** 2, 0) / points.length);

/** Norms of a table whose columns are computed from the coordinates. */
async function read(fields: object[], columns: Record<string, (x: number, y: number) => number>): Promise<GridNorms> {
  const definition = caseDefinitionSchema.parse({ fields });
  const header = ['x', 'y', ...Object.keys(columns)];
  const rows = points.map(({ x, y }) => [x, y, ...Object.values(columns).map((of) => of(x, y))].join(','));
  const gradients = definition.fields.filter(({ norms }) => norms.some(({ norm }) => norm === 'H1')).map(({ field }) => field);
  const { found } = matchColumns(header, { dimension: 2, fields: definition.fields.map(({ field }) => field), gradients });
  const reading = planReading({ definition, problem, mapping: { ...found, x: 'x', y: 'y', weight: null }, grid: {} });
  const ask = async (asked: typeof reading) => (await readGrid(byteSource([header.join(','), ...rows].join('\n')), asked)).norms;
  const first = await ask(reading);
  const datums = findDatums(definition, first);
  const again = planSecondReading(reading, datums);
  return joinNorms(definition, first, { second: again ? await ask(again) : null, datums });
}

describe('reading the fields of a case', () => {
  it('compares with an expression of exact fields, its derivatives and constants', async () => {
    const { fields: [flux] } = await read([{ field: 'flux', compare: '-k*d(T, x)', norms: [{ norm: 'L2' }] }], { flux: (x, y) => -0.5 * Math.cos(x) * y + error(x, y) });
    expect(flux?.L2).toBeCloseTo(root(error), 14);
    expect(flux?.exact.L2).toBeCloseTo(root((x, y) => 0.5 * Math.cos(x) * y), 14);
  });

  it('takes the mean out where a field is known up to a constant', async () => {
    const { fields: [found] } = await read([{ field: 'T', datum: 'mean', norms: [{ norm: 'L2' }] }], { T: (x, y) => exact(x, y) + 3 + error(x, y) });
    const mean = points.reduce((sum, { x, y }) => sum + error(x, y), 0) / points.length;
    expect(found?.datum?.value).toBeCloseTo(3 + mean, 12);
    expect(found?.L2).toBeCloseTo(root((x, y) => error(x, y) - mean), 12);
    expect(found?.Linf).toBeCloseTo(Math.max(...points.map(({ x, y }) => Math.abs(error(x, y) - mean))), 12);
    expect(found?.mean).toBeCloseTo(0, 12);
    expect(found?.exact.L2).toBeCloseTo(root(exact), 14);
  });

  it('takes the factor out where a field is known up to a scale, of either sign', async () => {
    const { fields: [found, ...more] } = await read([{ field: 'T', datum: 'scale', norms: [{ norm: 'L2' }] }], { T: (x, y) => -4 * exact(x, y) });
    expect(more).toEqual([]);
    expect(found?.datum).toMatchObject({ kind: 'scale', value: expect.closeTo(-0.25, 12) as number });
    expect(found?.L2).toBeLessThan(1e-12);
  });

  it('makes the H1 seminorm of the columns of a gradient', async () => {
    const { fields, gradients } = await read([{ field: 'T', norms: [{ norm: 'L2' }, { norm: 'H1' }] }], {
      T: exact, T_x: (x, y) => Math.cos(x) * y + error(x, y), dTdy: (x, y) => Math.sin(x) - 2 * error(x, y),
    });
    expect(fields.map(({ field }) => field)).toEqual(['T']);
    expect(gradients?.[0]?.H1).toBeCloseTo(root((x, y) => Math.hypot(error(x, y), 2 * error(x, y))), 14);
    expect(gradients?.[0]?.exactH1).toBeCloseTo(root((x, y) => Math.hypot(Math.cos(x) * y, Math.sin(x))), 14);
  });

  it('needs no column of a field of which only the gradient is judged', async () => {
    const { fields, gradients } = await read([{ field: 'T', norms: [{ norm: 'H1' }] }], { T_x: (x, y) => Math.cos(x) * y, T_y: (x) => Math.sin(x) });
    expect(fields).toEqual([]);
    expect(gradients?.[0]?.H1).toBe(0);
  });
});

describe('cell averages', () => {
  const u = problemDefinitionSchema.parse({ equation: 'none', dimension: 1, exact: { u: 'exp(x)' }, domain: { x: [0, 1] } });
  const definition = caseDefinitionSchema.parse({ sampling: 'average', fields: [{ field: 'u', norms: [{ norm: 'L2', formalOrder: 4 }] }] });
  const cells = Array.from({ length: 8 }, (_, i) => ({ x: (i + 0.5) / 8, mean: 8 * (Math.exp((i + 1) / 8) - Math.exp(i / 8)) }));
  const plan = (extents: object, cellsPerDirection?: number) => planReading({ definition, problem: u, mapping: { x: 'x', weight: null, fields: { u: 'u' }, ...extents }, grid: { cellsPerDirection } });
  const L2 = async (reading: ReturnType<typeof plan>) => (await readGrid(byteSource(['x,u,dx', ...cells.map(({ x, mean }) => `${x},${mean},0.125`)].join('\n')), reading)).norms.fields[0]?.L2;

  it('are compared with the average of the exact field over each cell, of stated size or uniform', async () => {
    expect(await L2(plan({ dx: 'dx' }))).toBeLessThan(1e-11);
    expect(await L2(plan({}, 8))).toBeLessThan(1e-11);
    expect(await L2({ ...plan({}, 8), average: undefined })).toBeGreaterThan(1e-4);
    expect(plan({}, 8).average).toEqual({ points: 4, extents: [0.125] });
  });
  it('are rejected where nothing tells the size of the cells', () => {
    expect(() => plan({})).toThrow();
  });
});

describe('bestScale(root means)', () => {
  it('is 1 where there is nothing to scale', () => {
    expect(bestScale({ error: 1, exact: 1, value: 0 })).toBe(1);
    expect(bestScale({ error: Math.SQRT2, exact: 1, value: 1 })).toBeCloseTo(1, 6);
  });
});
