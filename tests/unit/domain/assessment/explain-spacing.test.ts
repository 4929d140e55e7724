import { describe, expect, it } from 'vitest';
import { explainSpacing } from '@/lib/domain/assessment/explain-spacing';
import { formatCount } from '@/lib/domain/numbers/format-count';
import { assessmentSchema } from '@/lib/domain/assessment/schema';

const input = (label: string, rows: number, weightSum: number | null = 1) => ({ label, sha256: '', bytes: 1, rows, weightSum });

describe('explainSpacing(grids, inputs, around)', () => {
  it('has nothing to say where rows are cells and the weights add up alike', () => {
    const grids = [{ label: 'n8', cellsPerDirection: 8 }, { label: 'n16', cells: 256 }, { label: 'n32' }];
    expect(explainSpacing(grids, [input('n8', 64), input('n16', 256, 1 + 1e-7), input('n32', 1089)], { dimension: 2 })).toEqual([]);
    expect(explainSpacing([{ label: 'a', cellsPerDirection: [4, 2] }], [input('a', 8, null)], { dimension: 2 })).toEqual([]);
  });
  it('takes assessments made before the sum of weights was kept', () => {
    const before = { label: 'n8', sha256: '', bytes: 1, rows: 64 };
    expect(assessmentSchema.shape.inputs.parse([before])).toEqual([before]);
    expect(explainSpacing([], [before, input('n16', 256), input('n32', 1024, 2)], { dimension: 2 })).toEqual([expect.stringContaining('those of n16')]);
  });
  it('names rows that are not the cells stated', () => {
    const grids = [{ label: 'n8', cellsPerDirection: 8 }, { label: 'n16', cells: 256 }];
    expect(explainSpacing(grids, [input('n8', 81), input('n16', 289)], { dimension: 2 })).toEqual([
      'The file of n8 has 81 rows, where 64 cells are stated, and 1 more grid differs: right for nodes or quadrature points, else a part is missing or twice there.',
    ]);
  });
  it('names weights that add up to another sum', () => {
    expect(explainSpacing([], [input('n8', 64, 1), input('n16', 256, 1.00001)], { dimension: 2 })).toEqual([
      'The weights of n16 add up to 1.00001000, those of n8 to 1.00000000: the grids may not cover the same domain.',
    ]);
  });
  it('names a sum of weights that is not the volume of the domain', () => {
    expect(explainSpacing([], [input('n8', 64, 0.1), input('n16', 256, 0.1)], { dimension: 2, volume: 1 })).toEqual([
      'The weights of n8 add up to 0.100000000, while the box of the problem measures 1.00000000: right where they carry a thickness, else the grid may not cover the domain.',
    ]);
  });
  it('names rows that repeat coordinates, counted or estimated', () => {
    const mesh = (rows: number, oneIn: number) => ({ low: [0], high: [1], duplicates: { rows, oneIn } });
    expect(explainSpacing([], [{ ...input('n8', 64), mesh: mesh(0, 1) }, { ...input('n16', 1e6), mesh: mesh(2048, 16) }], { dimension: 2 })).toEqual([
      `The file of n16 has about ${formatCount(2048)} rows (estimated from one in 16) at the coordinates of an earlier one: cells of several partitions, ghost cells, or nodes written with each element count twice.`,
    ]);
    expect(explainSpacing([], [{ ...input('n8', 64), mesh: mesh(1, 1) }], { dimension: 2 })[0]).toContain('has 1 row at');
  });
  it('names nodes that are counted as cells', () => {
    const mesh = { low: [0, 0], high: [1, 1], duplicates: { rows: 0, oneIn: 1 } };
    const around = { dimension: 2, box: { x: [0, 1], y: [0, 1] } as const };
    expect(explainSpacing([{ label: 'n8', cells: 81 }], [{ ...input('n8', 81), mesh }], around)).toEqual([
      'The 81 rows of n8 reach the ends of the domain, as nodes do, and as many cells are stated: nodes counted as cells bias the orders of coarse grids.',
    ]);
    expect(explainSpacing([{ label: 'n8', cells: 64 }], [{ ...input('n8', 64), mesh: { ...mesh, low: [0.06, 0.06], high: [0.94, 0.94] } }], around)).toEqual([]);
  });
});
