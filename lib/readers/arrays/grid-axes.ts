import type { ArrayColumn, NamedArray } from './array-columns';

/** Axes are held in memory. */
const longestAxis = 4_000_000;

/** How a column takes part in the rows of a grid: as it is, or as an axis whose values stand for `inner` rows each, again and again. */
export interface RowsOfColumn { rows: number; inner: number | null }

/**
 * The rows that columns have together. Beside an array of several dimensions, flattened, one of one dimension is an axis
 * where its length is that of exactly one of them; of a grid of 32 × 32 it could be either, and is none.
 */
export function alignColumns(found: readonly ArrayColumn[], arrays: readonly NamedArray[]): RowsOfColumn[] {
  const dimsOf = (column: ArrayColumn) => arrays[column.array]?.dims ?? [];
  const grid = found.filter((column) => column.elements === 1 && dimsOf(column).length > 1).reduce<ArrayColumn | null>((largest, column) => (largest === null || column.rows > largest.rows ? column : largest), null);
  return found.map((column) => {
    const own = { rows: column.rows, inner: null };
    if (grid === null || column.rows === grid.rows || column.rows > longestAxis || dimsOf(column).length !== 1) return own;
    const dims = dimsOf(grid);
    const axis = dims.indexOf(column.rows);
    if (axis < 0 || dims.includes(column.rows, axis + 1)) return own;
    return { rows: grid.rows, inner: dims.slice(axis + 1).reduce((product, dim) => product * dim, 1) };
  });
}

/** Rows from `from` of a grid, by one of its axes. */
export function spreadAxis(axis: Float64Array, inner: number, { from, count }: { from: number; count: number }, into: Float64Array): void {
  for (let row = 0; row < count; row += 1) into[row] = axis[Math.floor((from + row) / inner) % axis.length] as number;
}
