import { describe, expect, it } from 'vitest';
import { studySeries } from '@/lib/domain/assessment/study-series';
import type { StudyGrid } from '@/lib/domain/assessment/study-to-assess';
import { caseDefinitionSchema, type CaseDefinition } from '@/lib/domain/cases/definition';
import type { GridInput } from '@/lib/domain/studies/input';
import { assessSeries } from '@/lib/numerics/assess-series';
import { edges, surveyOf, tensorCells, type MeshCells } from '../../../support/mesh';

const definition = caseDefinitionSchema.parse({ sampling: 'point', fields: [{ field: 'u', norms: [{ norm: 'L2', formalOrder: 2 }] }] });
const box = { x: [0, 1], y: [0, 1], z: [0, 0.1] } as const;
const sizes = [8, 16, 32, 64];

/** A grid whose L2 error is h², read from cells. */
function grid(label: string, cells: MeshCells, stated: Partial<GridInput>): StudyGrid {
  const rows = cells.volumes.length;
  const error = 1 / Math.max(...cells.centres.map((centre) => centre.length)) / rows;
  const column = { field: 'u', L1: error, L2: error, Linf: error, at: { x: 0 }, mean: 0, exact: { L1: 1, L2: 1, Linf: 1 }, min: 0, max: 1, maxAbs: 1, count: rows, significantDigits: null };
  return { grid: { label, cells: rows, ...stated }, norms: { rows, weightSum: cells.volumes.reduce((sum, volume) => sum + volume, 0), equalWeights: false, fields: [column], mesh: surveyOf(cells) } };
}
const similarityOf = (grids: StudyGrid[], changes: Partial<CaseDefinition> = {}, refinement: 'space' | 'time' = 'space') => {
  const series = studySeries({ definition: { ...definition, ...changes }, grids, refinement, dimension: 2, volume: 1, box });
  return series.ok ? series.similarity : series.reason;
};
const uniform = (n: number) => tensorCells(edges(n), edges(n));
/** Twice as fine each time in x < 1/2 only. */
const local = (n: number) => tensorCells([...edges(n / 2, (s) => s / 2), ...edges(4, (s) => 0.5 + s / 2).slice(1)], edges(n));

describe('similarity of the grids of a study', () => {
  it('is judged where rows are the cells stated, or hold averages', () => {
    const series = studySeries({ definition, grids: sizes.map((n) => grid(`n${n}`, local(n), {})), refinement: 'space', dimension: 2, volume: 1, box });
    if (!series.ok) throw new Error(series.reason);
    const { outcome, reasons, similarity } = assessSeries(series);
    expect([outcome, reasons, similarity?.isSimilar]).toEqual(['inconclusive', ['not-similar'], false]);
    expect(similarityOf(sizes.map((n) => grid(`n${n}`, uniform(n), {})))).toMatchObject({ isSimilar: true });
    const bySize = sizes.map((n) => grid(`n${n}`, local(n), { cells: undefined, h: 1 / n }));
    expect(similarityOf(bySize)).toBeNull();
    expect(similarityOf(bySize, { sampling: 'average' })).toMatchObject({ isSimilar: false });
  });

  it('is not judged of quadrature points, of nodes, of equal weights, or in time', () => {
    const grids = sizes.map((n) => grid(`n${n}`, local(n), {}));
    expect(similarityOf(grids, { sampling: 'quadrature' })).toBeNull();
    expect(similarityOf(grids.map((each) => ({ ...each, norms: each.norms && { ...each.norms, equalWeights: true } })))).toBeNull();
    expect(similarityOf(grids.map((each, i) => ({ ...each, grid: { ...each.grid, dt: 2 ** -i } })), {}, 'time')).toBeNull();
    // Nodes reach the ends of the box, and those at its boundary weigh half.
    const nodes = sizes.map((n) => grid(`n${n}`, { centres: uniform(n).centres.map((centre) => centre.map((at) => (at - 0.5 / n) * (n / (n - 1)))), volumes: local(n).volumes.slice(0, n * n).concat(Array.from({ length: Math.max(0, n * n - local(n).volumes.length) }, () => 1)) }, {}));
    expect(similarityOf(nodes)).toBeNull();
  });

  it('is judged by counts along directions where errors are typed', () => {
    const typed = [[8, 8], [16, 8], [32, 8], [64, 8]].map(([n = 1, m = 1]): StudyGrid => ({ grid: { label: `n${n}`, cellsPerDirection: [n, m], errors: { u: { L2: 1 / n / m } } }, norms: null }));
    expect(similarityOf(typed)).toMatchObject({ isSimilar: false });
  });
});

describe('a mesh one cell thick', () => {
  const spacingsOf = (grids: StudyGrid[]) => {
    const series = studySeries({ definition, grids, refinement: 'space', dimension: 3, volume: 0.1, box });
    return series.ok ? series.errors[0]?.grids.map(({ h }) => h) : series.reason;
  };
  it('is refined in two dimensions, by its file or by counts along directions', () => {
    const thin = (n: number) => tensorCells(edges(n), edges(n), [0, 0.1]);
    const close = [1 / 64, 1 / 32, 1 / 16, 1 / 8].map((h) => expect.closeTo(h, 12) as number);
    expect(spacingsOf(sizes.map((n) => grid(`n${n}`, thin(n), {})))).toEqual(close);
    expect(spacingsOf(sizes.map((n): StudyGrid => ({ grid: { label: `n${n}`, cellsPerDirection: [n, n, 1], errors: { u: { L2: 1 / n } } }, norms: null })))).toEqual(close);
  });
  it('is not, where one of the grids is thicker', () => {
    const counts = sizes.map((n): StudyGrid => ({ grid: { label: `n${n}`, cellsPerDirection: [n, n, n / 8], errors: { u: { L2: 1 / n } } }, norms: null }));
    expect(spacingsOf(counts)).toEqual(sizes.toReversed().map((n) => expect.closeTo((0.1 / (n ** 3 / 8)) ** (1 / 3), 12) as number));
  });
});
