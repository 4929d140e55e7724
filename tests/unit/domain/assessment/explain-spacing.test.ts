import { describe, expect, it } from 'vitest';
import { explainSpacing } from '@/lib/domain/assessment/explain-spacing';
import { assessmentSchema } from '@/lib/domain/assessment/schema';

const input = (label: string, rows: number, weightSum: number | null = 1) => ({ label, sha256: '', bytes: 1, rows, weightSum });

describe('explainSpacing(grids, inputs, dimension)', () => {
  it('has nothing to say where rows are cells and the weights add up alike', () => {
    const grids = [{ label: 'n8', cellsPerDirection: 8 }, { label: 'n16', cells: 256 }, { label: 'n32' }];
    expect(explainSpacing(grids, [input('n8', 64), input('n16', 256, 1 + 1e-7), input('n32', 1089)], 2)).toEqual([]);
    expect(explainSpacing([{ label: 'a', cellsPerDirection: [4, 2] }], [input('a', 8, null)], 2)).toEqual([]);
  });
  it('takes assessments made before the sum of weights was kept', () => {
    const before = { label: 'n8', sha256: '', bytes: 1, rows: 64 };
    expect(assessmentSchema.shape.inputs.parse([before])).toEqual([before]);
    expect(explainSpacing([], [before, input('n16', 256), input('n32', 1024, 2)], 2)).toEqual([expect.stringContaining('those of n16')]);
  });
  it('names rows that are not the cells stated', () => {
    const grids = [{ label: 'n8', cellsPerDirection: 8 }, { label: 'n16', cells: 256 }];
    expect(explainSpacing(grids, [input('n8', 81), input('n16', 289)], 2)).toEqual([
      'The file of n8 has 81 rows, where 64 cells are stated, and 1 more grid differs: right for nodes or quadrature points, else a part is missing or twice there.',
    ]);
  });
  it('names weights that add up to another sum', () => {
    expect(explainSpacing([], [input('n8', 64, 1), input('n16', 256, 1.00001)], 2)).toEqual([
      'The weights of n16 add up to 1.00001000, those of n8 to 1.00000000: the grids may not cover the same domain.',
    ]);
  });
});
