import type { ColumnEngine } from '../column-engine';
import { createBlockEvaluator, type VariableValues } from './block-evaluator';
import { gaussLegendre } from './gauss-legendre';
import type { Node } from './node';

/** Size of the cell of every row along each coordinate: a column, or one number for all. */
export type CellExtents = Partial<Record<'x' | 'y' | 'z', Float64Array | number>>;

const capacity = 2048;
const axes = ['x', 'y', 'z'] as const;

/**
 * Averages nodes over the cell of every row, a box about its coordinates, by Gauss–Legendre rules of `points` points per
 * direction: what a finite-volume code stores. Columns as of createBlockEvaluator, of up to 2048 rows; they hold until the next call.
 */
export function createAverageEvaluator(
  nodes: readonly Node[], points: number, engine: ColumnEngine | null = null,
): (rows: number, variables: VariableValues, extents: CellExtents) => readonly Float64Array[] {
  const evaluate = createBlockEvaluator(nodes, capacity, engine);
  const allocate = () => engine?.allocate(capacity) ?? new Float64Array(capacity);
  const rule = gaussLegendre(points);
  const sums = nodes.map(allocate);
  const moved = { x: allocate(), y: allocate(), z: allocate() };
  return (rows, variables, extents) => {
    for (const sum of sums) sum.fill(0, 0, rows);
    const directions = axes.filter((axis) => variables[axis] !== undefined && extents[axis] !== undefined);
    const visit = (depth: number, weight: number) => {
      const axis = directions[depth];
      if (axis === undefined) {
        addWeighted(sums, evaluate(rows, { ...variables, ...Object.fromEntries(directions.map((each) => [each, moved[each]])) }), { weight, rows });
        return;
      }
      for (const { point, weight: part } of rule) {
        move(moved[axis], variables[axis] ?? 0, { extent: extents[axis] ?? 0, by: point / 2, rows });
        visit(depth + 1, (weight * part) / 2);
      }
    };
    visit(0, 1);
    return sums;
  };
}

function addWeighted(sums: readonly Float64Array[], values: readonly Float64Array[], { weight, rows }: { weight: number; rows: number }): void {
  for (const [at, sum] of sums.entries()) {
    const column = values[at] as Float64Array;
    for (let i = 0; i < rows; i += 1) sum[i] = (sum[i] as number) + weight * (column[i] as number);
  }
}

function move(into: Float64Array, from: Float64Array | number, { extent, by, rows }: { extent: Float64Array | number; by: number; rows: number }): void {
  for (let i = 0; i < rows; i += 1) {
    const centre = typeof from === 'number' ? from : from[i] as number;
    into[i] = centre + by * (typeof extent === 'number' ? extent : extent[i] as number);
  }
}
