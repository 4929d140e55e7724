import type { GridInput } from './input';

/** Cells of a grid in all, as far as stated; null where only its file tells. */
export function cellCount({ cells, cellsPerDirection }: Pick<GridInput, 'cells' | 'cellsPerDirection'>, dimension: number): number | null {
  if (cells !== undefined) return cells;
  if (cellsPerDirection === undefined) return null;
  return typeof cellsPerDirection === 'number' ? cellsPerDirection ** dimension : cellsPerDirection.reduce((product, count) => product * count, 1);
}
