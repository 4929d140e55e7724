import { describe, expect, it } from 'vitest';
import { readNorms } from '@/lib/services/reading/read-norms';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import { wholeFields } from '@/lib/domain/assessment/whole-fields';
import { studySeries } from '@/lib/domain/assessment/study-series';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { assessSeries } from '@/lib/numerics/assess-series';
import { readGrid } from '@/lib/readers/read-grid';
import { byteSource } from '../support/byte-source';
import { solveQuadraticElements, threePoints, twoPoints } from '../support/quadratic-elements';

const sizes = [4, 8, 16, 32, 64];
const problem = problemDefinitionSchema.parse({ equation: 'poisson', dimension: 1, exact: { u: 'sin(pi*x)' }, domain: { x: [0, 1] } });

async function assess(declared: unknown, tableOf: (elements: number) => string, columns: Record<string, string | string[]>) {
  const definition = caseDefinitionSchema.parse(declared);
  const grids = await Promise.all(sizes.map(async (cellsPerDirection) => {
    const mapping = { x: 'x', weight: 'w', fields: columns };
    const { norms } = await readNorms({ definition, problem, mapping, grid: { cellsPerDirection }, seenAs: 1, statedSha256: null }, (reading) => readGrid(byteSource(tableOf(cellsPerDirection)), reading));
    return { grid: { label: String(cellsPerDirection), cellsPerDirection }, norms };
  }));
  const series = studySeries({ definition, grids, refinement: 'space', dimension: 1, volume: 1, box: { x: [0, 1] } });
  if (!series.ok) throw new Error(series.reason);
  return wholeFields(assessSeries(series).fields).map(({ norm, outcome, reasons, orders }) => ({ norm, outcome, reasons, order: orders[0]?.order ?? NaN }));
}

const atPoints = (rule: typeof twoPoints | typeof threePoints) => (elements: number) => `x,w,u,u_x\n${solveQuadraticElements(elements, rule).points.map(({ x, w, u, slope }) => [x, w, u, slope].join(',')).join('\n')}\n`;
const atNodes = (elements: number) => `x,w,u\n${solveQuadraticElements(elements).nodes.map(({ x, u }) => [x, 1, u].join(',')).join('\n')}\n`;
const field = (...norms: unknown[]) => ({ sampling: 'quadrature', fields: [{ field: 'u', norms }] });

// Orders k + 1 in L2 and k in H1 of elements of degree k, one more at nodes (even degree) and of slopes at k Gauss points: common practice.
describe('elements of degree 2', () => {
  it('have order 3 in L2 and 2 in H1 by quadrature with three points', async () => {
    const found = await assess(field({ norm: 'L2', formalOrder: 3 }, { norm: 'H1', formalOrder: 2 }), atPoints(threePoints), { u: ['u', 'u_x'] });
    expect(found).toMatchObject([{ outcome: 'pass', order: expect.closeTo(3, 1) as number }, { outcome: 'pass', order: expect.closeTo(2, 1) as number }]);
  });

  it('show order 3 in H1 with two points, where slopes superconverge', async () => {
    const [norm] = await assess(field({ norm: 'H1', formalOrder: 2 }), atPoints(twoPoints), { u: ['u', 'u_x'] });
    expect(norm).toMatchObject({ outcome: 'inconclusive', reasons: ['above-formal'], order: expect.closeTo(3, 1) as number });
  });

  it('show order 4 at the nodes, which superconverge', async () => {
    const [norm] = await assess(field({ norm: 'L2', formalOrder: 3 }), atNodes, { u: 'u' });
    expect(norm).toMatchObject({ outcome: 'inconclusive', reasons: ['above-formal'], order: expect.closeTo(4, 1) as number });
  });
});
