import { createCellMeasurer } from './cell-measure';
import type { CellRows, RefuseCell } from './cell-rows';
import { findCellShape, type CellShape } from './cell-types';
import { lengthAlong } from './grid-file';
import type { StoredNumbers } from './stored-segment';

/** The coordinate of the point with a number along one direction, from 0. */
export type Axis = (index: number) => number;
export type Axes = readonly [Axis, Axis, Axis];

/** Cells between lines along the axes: centres, sizes and their product. A direction with one point has no size and no part in it. */
export function createStraightCells(extent: readonly number[], axes: Axes, refuse: RefuseCell): CellRows {
  const cells = cellsAlong(extent);
  const spread = [0, 1, 2].map((axis) => lengthAlong(extent, axis) > 1);
  const side = (axis: 0 | 1 | 2, at: number): { middle: number; size: number } => {
    const low = axes[axis](at);
    if (!spread[axis]) return { middle: low, size: 0 };
    const size = axes[axis](at + 1) - low;
    if (!(size > 0)) refuse('malformed-vtk', `${low + size} after ${low} along ${'xyz'[axis]}`, 'coordinates that rise');
    return { middle: low + size / 2, size };
  };
  return {
    fill(from, count, into) {
      for (let row = 0; row < count; row += 1) {
        const [i, j, k] = placeOf(from + row, cells);
        const [x, y, z] = [side(0, i), side(1, j), side(2, k)];
        into.x[row] = x.middle;
        into.y[row] = y.middle;
        into.z[row] = z.middle;
        into.dx[row] = x.size;
        into.dy[row] = y.size;
        into.dz[row] = z.size;
        into.volume[row] = (spread[0] ? x.size : 1) * (spread[1] ? y.size : 1) * (spread[2] ? z.size : 1);
      }
    },
  };
}

/**
 * Cells of a grid whose points stand in rows, columns and layers wherever they are: hexahedra, quads, lines or a vertex. Such
 * grids turn either way, so that a volume is negative where its sign differs from that of the first cell.
 */
export function createCurvedCells(extent: readonly number[], coordinate: StoredNumbers): CellRows {
  const points = pointsAlong(extent);
  const cells = cellsAlong(extent);
  const measure = createCellMeasurer();
  const spread = [0, 1, 2].filter((axis) => (points[axis] ?? 1) > 1);
  const strides = [1, points[0], points[0] * points[1]] as const;
  const [a, b, c] = spread.map((axis) => strides[axis] ?? 0);
  const corners = new Float64Array(24);
  const [shape, steps] = layOut(a, b, c);
  let sign = 0;
  return {
    fill(from, count, into) {
      for (let row = 0; row < count; row += 1) {
        const [i, j, k] = placeOf(from + row, cells);
        const first = i + strides[1] * j + strides[2] * k;
        for (const [at, step] of steps.entries()) {
          for (let axis = 0; axis < 3; axis += 1) corners[3 * at + axis] = coordinate(3 * (first + step) + axis);
        }
        const found = measure(shape, corners, steps.length);
        into.x[row] = found.x;
        into.y[row] = found.y;
        into.z[row] = found.z;
        if (sign === 0) sign = found.measure < 0 ? -1 : 1;
        into.volume[row] = sign * found.measure;
      }
    },
  };
}

/** The cell of as many directions as have a step, and the steps from its first point to its corners. */
function layOut(a: number | undefined, b: number | undefined, c: number | undefined): [CellShape, number[]] {
  const [number, steps] = a === undefined ? [1, [0]] : b === undefined ? [3, [0, a]] : c === undefined ? [9, [0, a, a + b, b]]
    : [12, [0, a, a + b, b, c, c + a, c + a + b, c + b]];
  const shape = findCellShape(number);
  if (shape === undefined) throw new RangeError(`There is no cell of type ${number}.`);
  return [shape, steps];
}

/** Along each direction the place of the point or cell with a number, x running first. */
export function placeOf(number: number, along: readonly [number, number, number]): readonly [number, number, number] {
  const rest = Math.floor(number / along[0]);
  return [number % along[0], rest % along[1], Math.floor(rest / along[1])];
}

export function pointsAlong(extent: readonly number[]): readonly [number, number, number] {
  return [lengthAlong(extent, 0), lengthAlong(extent, 1), lengthAlong(extent, 2)];
}

function cellsAlong(extent: readonly number[]): readonly [number, number, number] {
  const [x, y, z] = pointsAlong(extent);
  return [Math.max(1, x - 1), Math.max(1, y - 1), Math.max(1, z - 1)];
}
