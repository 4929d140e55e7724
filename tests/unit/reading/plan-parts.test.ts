import { describe, expect, it } from 'vitest';
import { studySeries } from '@/lib/domain/assessment/study-series';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import { matchColumns } from '@/lib/domain/columns/match-columns';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { assessSeries } from '@/lib/numerics/assess-series';
import { readGrid } from '@/lib/readers/read-grid';
import { planParts, type PartsAsked } from '@/lib/services/reading/plan-parts';
import { readNorms } from '@/lib/services/reading/read-norms';
import { byteSource } from '../../support/byte-source';
import { outflowProblem, outflowTable } from '../../support/outflow';

const flat = problemDefinitionSchema.parse({ equation: 'none', dimension: 2, exact: { u: 'x*y' }, domain: { x: [0, 2], y: [0, 1] } });
const definition = caseDefinitionSchema.parse({ fields: [{ field: 'u', norms: [{ norm: 'L2' }] }], boundaryBand: { thickness: 0.1 } });
const asked: PartsAsked = { definition, problem: flat, mapping: { x: 'x', y: 'y', weight: 'w', fields: { u: 'u' } }, grid: { cells: 200 }, seenAs: 2 };
const box = [[0, 2], [0, 1]];
const at = (thickness: number) => ({ by: 'thickness', thickness });

describe('planParts(asked)', () => {
  it('takes two stated spacings and the thickness of the case along the box of the problem', () => {
    expect(planParts(asked).bands).toEqual({ distance: box, bands: [{ name: '2h', test: at(2 * Math.sqrt(2 / 200)) }, { name: 'fixed', test: at(0.1) }] });
    expect(planParts({ ...asked, grid: { cellsPerDirection: [20, 5] } }).bands?.bands[0]?.test).toEqual(at(2 * (Math.SQRT2 / 10)));
    expect(planParts({ ...asked, grid: { h: 0.03, dt: 0.1 } }).bands?.bands[0]?.test).toEqual(at(0.06));
    expect(planParts(asked).maps).toMatchObject({ dimension: 2, box, h: Math.sqrt(2 / 200) });
  });

  it('takes the size of each row where no spacing is stated, and none where rows tell no size', () => {
    expect(planParts({ ...asked, grid: {} }).bands?.bands[0]?.test).toEqual({ by: 'weight', dimension: 2 });
    expect(planParts({ ...asked, grid: {}, mapping: { ...asked.mapping, weight: null } }).bands?.bands.map(({ name }) => name)).toEqual(['fixed']);
  });

  it('goes by a column of distances before the box, and by flags before the thickness', () => {
    const { bands } = planParts({ ...asked, mapping: { ...asked.mapping, distance: 'd', flag: 'f' } });
    expect(bands).toMatchObject({ distance: 'column', bands: [{ name: '2h' }, { name: 'fixed', test: { by: 'flag' } }] });
    const boxless = { ...flat, domain: undefined };
    expect(planParts({ ...asked, problem: boxless, mapping: { ...asked.mapping, flag: 'f' } }).bands).toEqual({ distance: null, bands: [{ name: 'fixed', test: { by: 'flag' } }] });
    // Without the box a count of cells is no length.
    expect(planParts({ ...asked, problem: boxless, mapping: { ...asked.mapping, distance: 'd' } }).bands?.bands[0]?.test).toEqual({ by: 'weight', dimension: 2 });
  });

  it('asks for nothing where nothing tells the boundary', () => {
    expect(planParts({ ...asked, problem: { ...flat, domain: undefined } }).bands).toBeUndefined();
    expect(planParts({ ...asked, problem: { ...flat, domain: { x: [0, 2] } } })).toMatchObject({ maps: { box: null, h: null } });
    // A mesh one cell thick lies at the boundary in every row.
    expect(planParts({ ...asked, seenAs: 1 }).bands).toBeUndefined();
  });
});

const root = (values: readonly number[]) => Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);

describe('regions and maps of a file', () => {
  it('are those of the second reading where a mean is taken out, gradients too', async () => {
    const n = 12;
    const points = Array.from({ length: n * n }, (_, i) => ({ x: ((i % n) + 0.5) / (n / 2), y: (Math.floor(i / n) + 0.5) / n }));
    const error = ({ x, y }: (typeof points)[number]) => 0.01 * Math.cos(5 * x + y);
    const rows = points.map((point) => [point.x, point.y, 2 / n ** 2, point.x * point.y + 7 + error(point), point.y + error(point), point.x].join(','));
    const fields = caseDefinitionSchema.parse({ fields: [{ field: 'u', datum: 'mean', norms: [{ norm: 'L2' }, { norm: 'H1' }] }] });
    const { found } = matchColumns(['x', 'y', 'w', 'u', 'u_x', 'u_y'], { dimension: 2, fields: ['u'], gradients: ['u'] });
    const { norms, maps } = await readNorms({ definition: fields, problem: flat, mapping: { ...found, x: 'x', weight: 'w' }, grid: { h: 0.1 }, seenAs: 2, statedSha256: null },
      (reading) => readGrid(byteSource(['x,y,w,u,u_x,u_y', ...rows].join('\n')), reading));
    const mean = points.reduce((sum, point) => sum + error(point), 0) / points.length;
    const inside = points.filter(({ x, y }) => Math.min(x, 2 - x, y, 1 - y) > 0.2);
    const interior = norms.regions?.find(({ region }) => region === 'interior-2h');
    expect(interior?.rows).toBe(inside.length);
    expect(interior?.fields.map(({ field }) => field)).toEqual(['u']);
    expect(interior?.fields[0]?.L2).toBeCloseTo(root(inside.map((point) => error(point) - mean)), 13);
    expect(interior?.gradients?.[0]?.H1).toBeCloseTo(root(inside.map(error)), 13);
    expect(maps.map(({ field, plane, width, height }) => [field, plane, width, height])).toEqual([['u', 'xy', 20, 10]]);
    expect(maps[0]?.largest).toBeCloseTo(Math.max(...points.map((point) => Math.abs(error(point) - mean))), 8);
  });

  it('of a first-order closure show a lower order along the boundary, which is what is hinted at', async () => {
    const problem = problemDefinitionSchema.parse(outflowProblem);
    const outflow = caseDefinitionSchema.parse({ sampling: 'point', fields: [{ field: 'u', norms: [{ norm: 'L1', formalOrder: 2 }, { norm: 'L2', formalOrder: 2 }, { norm: 'Linf', formalOrder: 2 }] }] });
    const mapping = { x: 'x', weight: 'w', fields: { u: 'u' } };
    const grids = await Promise.all([40, 80, 160, 320, 640].map(async (n) => {
      const grid = { label: `n${n}`, cellsPerDirection: n };
      const { norms } = await readNorms({ definition: outflow, problem, mapping, grid, seenAs: 1, statedSha256: null }, (reading) => readGrid(byteSource(outflowTable(n)), reading));
      return { grid, norms };
    }));
    const series = studySeries({ definition: outflow, grids, refinement: 'space', dimension: 1, volume: 1, box: problem.domain });
    if (!series.ok) throw new Error(series.reason);
    const { fields, outcome, patterns } = assessSeries(series);
    const lastOrder = (region: string, norm: string) => fields.find((field) => field.region === region && field.norm === norm)?.orders[0]?.order;
    expect(lastOrder('boundary-2h', 'L2')).toBeCloseTo(1, 1);
    expect(lastOrder('interior-2h', 'L2')).toBeCloseTo(2, 1);
    expect(outcome).toBe('fail');
    expect(fields.slice(0, 3).map(({ region }) => region)).toEqual(['all', 'all', 'all']);
    for (const part of fields.slice(3)) expect(part).toMatchObject({ outcome: null, reasons: [], counts: false });
    expect(patterns[0]).toMatchObject({ code: 'boundary-closure', evidence: { boundaryOrder: lastOrder('boundary-2h', 'L2') as number } });
  });
});
