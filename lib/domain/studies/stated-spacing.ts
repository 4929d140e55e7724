import type { StatedSpacing } from '@/lib/numerics/spacing/spacing-types';
import type { GridInput } from './input';

type GridStatement = Pick<GridInput, 'label' | 'h' | 'cells' | 'cellsPerDirection' | 'dt'>;
interface FileSums { rows: number; weightSum: number; equalWeights: boolean }

/**
 * What tells the spacing of a grid: what its author stated, and the sums of its file where its weights are sizes. Cells
 * along several directions count by their geometric mean, without those named as one cell thick on all grids.
 */
export function statedSpacing(grid: GridStatement, file: FileSums | null = null, thin: readonly number[] = []): StatedSpacing {
  const { label, h, cells, dt } = grid;
  const weighted = file !== null && !file.equalWeights;
  return { label, h, cells, dt, cellsPerDirection: meanCount(grid.cellsPerDirection, thin), rows: file?.rows, weightSum: weighted ? file.weightSum : undefined };
}

function meanCount(stated: number | number[] | undefined, thin: readonly number[]): number | undefined {
  if (stated === undefined || typeof stated === 'number') return stated;
  const counts = stated.filter((_, axis) => !thin.includes(axis));
  return counts.reduce((product, count) => product * count, 1) ** (1 / counts.length);
}
