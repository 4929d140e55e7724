import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createCellMeasurer } from '@/lib/readers/vtk/cell-measure';
import { findCellShape } from '@/lib/readers/vtk/cell-types';

type Point = readonly number[];
interface Reference { name: string; type: number; corners: readonly Point[]; measure: number; centre: Point; faces?: readonly (readonly number[])[] }

const ring = (sides: number, z: number): Point[] => Array.from({ length: sides }, (_, at) => [Math.cos((2 * Math.PI * at) / sides), Math.sin((2 * Math.PI * at) / sides), z]);
const ringArea = (sides: number) => (sides / 2) * Math.sin((2 * Math.PI) / sides);
const cube: Point[] = [[0, 0, 0], [1, 0, 0], [1, 1, 0], [0, 1, 0], [0, 0, 1], [1, 0, 1], [1, 1, 1], [0, 1, 1]];
const cubeFaces = [[0, 1, 2, 3], [4, 5, 6, 7], [0, 1, 5, 4], [2, 1, 5, 6], [2, 3, 7, 6], [3, 0, 4, 7]];

/** Cells of known measure and centre by school geometry. */
const references: Reference[] = [
  { name: 'a line', type: 3, corners: [[0, 0, 0], [1, 0, 0]], measure: 1, centre: [0.5, 0, 0] },
  { name: 'a polyline of two sides', type: 4, corners: [[0, 0, 0], [1, 0, 0], [3, 0, 0]], measure: 3, centre: [1.5, 0, 0] },
  { name: 'a triangle', type: 5, corners: [[0, 0, 0], [1, 0, 0], [0, 1, 0]], measure: 1 / 2, centre: [1 / 3, 1 / 3, 0] },
  { name: 'a strip', type: 6, corners: [[0, 0, 0], [0, 1, 0], [1, 0, 0], [1, 1, 0]], measure: 1, centre: [0.5, 0.5, 0] },
  { name: 'a hexagon', type: 7, corners: ring(6, 0), measure: ringArea(6), centre: [0, 0, 0] },
  { name: 'an L, which is not convex', type: 7, corners: [[0, 0, 0], [2, 0, 0], [2, 1, 0], [1, 1, 0], [1, 2, 0], [0, 2, 0]], measure: 3, centre: [5 / 6, 5 / 6, 0] },
  { name: 'a pixel', type: 8, corners: [[0, 0, 0], [1, 0, 0], [0, 1, 0], [1, 1, 0]], measure: 1, centre: [0.5, 0.5, 0] },
  { name: 'a quad', type: 9, corners: [[0, 0, 0], [1, 0, 0], [1, 1, 0], [0, 1, 0]], measure: 1, centre: [0.5, 0.5, 0] },
  { name: 'a trapezium', type: 9, corners: [[0, 0, 0], [3, 0, 0], [1, 1, 0], [0, 1, 0]], measure: 2, centre: [13 / 12, 5 / 12, 0] },
  { name: 'a tetrahedron', type: 10, corners: [[0, 0, 0], [1, 0, 0], [0, 1, 0], [0, 0, 1]], measure: 1 / 6, centre: [1 / 4, 1 / 4, 1 / 4] },
  { name: 'a voxel', type: 11, corners: [0, 1, 2, 3, 4, 5, 6, 7].map((at) => [at & 1, (at >> 1) & 1, at >> 2]), measure: 1, centre: [0.5, 0.5, 0.5] },
  { name: 'a hexahedron', type: 12, corners: cube, measure: 1, centre: [0.5, 0.5, 0.5] },
  // Of height 1 between squares of 2 and 1: h(A + √AB + B)/3, and its centre h(A + 2√AB + 3B)/(4(A + √AB + B)) above the larger.
  { name: 'a frustum', type: 12, corners: [[-1, -1, 0], [1, -1, 0], [1, 1, 0], [-1, 1, 0], [-0.5, -0.5, 1], [0.5, -0.5, 1], [0.5, 0.5, 1], [-0.5, 0.5, 1]], measure: 7 / 3, centre: [0, 0, 11 / 28] },
  { name: 'a wedge', type: 13, corners: [[0, 0, 0], [1, 0, 0], [0, 1, 0], [0, 0, 1], [1, 0, 1], [0, 1, 1]], measure: 1 / 2, centre: [1 / 3, 1 / 3, 0.5] },
  { name: 'a wedge the other way round', type: 13, corners: [[0, 0, 0], [0, 1, 0], [1, 0, 0], [0, 0, 1], [0, 1, 1], [1, 0, 1]], measure: 1 / 2, centre: [1 / 3, 1 / 3, 0.5] },
  { name: 'a pyramid', type: 14, corners: [[0, 0, 0], [1, 0, 0], [1, 1, 0], [0, 1, 0], [0, 0, 1]], measure: 1 / 3, centre: [3 / 8, 3 / 8, 1 / 4] },
  { name: 'a pentagonal prism', type: 15, corners: [...ring(5, 0), ...ring(5, 2)], measure: 2 * ringArea(5), centre: [0, 0, 1] },
  { name: 'a hexagonal prism', type: 16, corners: [...ring(6, 0), ...ring(6, 2)], measure: 2 * ringArea(6), centre: [0, 0, 1] },
  { name: 'a polyhedron with faces either way', type: 42, corners: cube, faces: cubeFaces, measure: 1, centre: [0.5, 0.5, 0.5] },
];

const number = fc.double({ min: -1, max: 1, noNaN: true });
/** Maps that leave no cell nearly flat: the larger numbers stand on the diagonal. */
const matrix = fc.tuple(fc.array(number, { minLength: 9, maxLength: 9 }), fc.boolean())
  .map(([m, isTurned]) => m.map((value, at) => (at % 4 === 0 ? (isTurned && at === 8 ? -1 : 1) * (3 + value) : value)));
const move = fc.array(number, { minLength: 3, maxLength: 3 });
const apply = (m: readonly number[], by: readonly number[], point: Point): number[] => (
  [0, 1, 2].map((row) => (by[row] ?? 0) + [0, 1, 2].reduce((sum, column) => sum + (m[3 * row + column] ?? 0) * (point[column] ?? 0), 0)));
const cross = (a: readonly number[], b: readonly number[]) => [0, 1, 2].map((i) => (a[(i + 1) % 3] ?? 0) * (b[(i + 2) % 3] ?? 0) - (a[(i + 2) % 3] ?? 0) * (b[(i + 1) % 3] ?? 0));
const column = (m: readonly number[], at: number) => [m[at] ?? 0, m[at + 3] ?? 0, m[at + 6] ?? 0];

/** What a map does to lengths along x, areas in x and y, and volumes. */
function stretch(m: readonly number[], dimension: number): number {
  const [a, b, c] = [column(m, 0), column(m, 1), column(m, 2)];
  if (dimension === 1) return Math.hypot(...a);
  if (dimension === 2) return Math.hypot(...cross(a, b));
  return cross(a, b).reduce((sum, value, at) => sum + value * (c[at] ?? 0), 0);
}

const measure = createCellMeasurer();
function measured({ type, corners, faces }: Pick<Reference, 'type' | 'corners' | 'faces'>) {
  const shape = findCellShape(type);
  if (!shape) throw new Error(`no shape of type ${type}`);
  return { ...measure(shape, Float64Array.from(corners.flat()), corners.length, faces), dimension: shape.dimension, mayTurn: shape.mayTurn || shape.kind === 'polyhedron' };
}

describe.each(references)('$name', ({ type, corners, faces, measure: known, centre }) => {
  it('has its measure and its centre', () => {
    const { measure: found, x, y, z } = measured({ type, corners, faces });
    expect(found).toBeCloseTo(known, 14);
    for (const [at, value] of [x, y, z].entries()) expect(value).toBeCloseTo(centre[at] ?? NaN, 14);
  });

  it('has them wherever an affine map puts it', () => {
    fc.assert(fc.property(matrix, move, (m, by) => {
      const found = measured({ type, corners: corners.map((point) => apply(m, by, point)), faces });
      const factor = stretch(m, found.dimension);
      const wanted = known * (found.mayTurn ? Math.abs(factor) : factor);
      expect(Math.abs(found.measure / wanted - 1)).toBeLessThan(1e-11);
      const place = apply(m, by, centre);
      for (const [at, value] of [found.x, found.y, found.z].entries()) expect(Math.abs(value - (place[at] ?? NaN))).toBeLessThan(1e-10);
    }), { numRuns: 100 });
  });
});

describe('a cell with curved faces', () => {
  /** ∭ |J| over a trilinear hexahedron, whose Jacobian is of degree 2 in each direction: 2 Gauss points in each are exact. */
  function trilinearVolume(corners: readonly Point[]): number {
    const gauss = [0.5 - Math.sqrt(1 / 12), 0.5 + Math.sqrt(1 / 12)];
    const derivative = ([x = 0, y = 0, z = 0]: Point, axis: number) => [0, 1, 2].map((component) => corners.reduce((sum, corner, at) => {
      const [i, j, k] = [[0, 1, 1, 0, 0, 1, 1, 0], [0, 0, 1, 1, 0, 0, 1, 1], [0, 0, 0, 0, 1, 1, 1, 1]].map((bits) => bits[at] ?? 0);
      const factors = [[x, i], [y, j], [z, k]].map(([value = 0, bit], along) => (along === axis ? (bit ? 1 : -1) : bit ? value : 1 - value));
      return sum + (corner[component] ?? 0) * factors.reduce((all, each) => all * each, 1);
    }, 0));
    return gauss.flatMap((x) => gauss.flatMap((y) => gauss.map((z) => {
      const [a = [], b = [], c = []] = [0, 1, 2].map((axis) => derivative([x, y, z], axis));
      return cross(a, b).reduce((sum, value, at) => sum + value * (c[at] ?? 0), 0) / 8;
    }))).reduce((sum, part) => sum + part, 0);
  }

  it('of eight corners has the volume of the trilinear map', () => {
    fc.assert(fc.property(fc.array(fc.array(fc.double({ min: -0.2, max: 0.2, noNaN: true }), { minLength: 3, maxLength: 3 }), { minLength: 8, maxLength: 8 }), (moves) => {
      const corners = cube.map((point, at) => point.map((value, axis) => value + (moves[at]?.[axis] ?? 0)));
      expect(measured({ type: 12, corners }).measure).toBeCloseTo(trilinearVolume(corners), 13);
    }));
  });
});

describe('a solid', () => {
  it('turned inside out is negative, and without extent has the mean of its corners as centre', () => {
    expect(measured({ type: 12, corners: cube.map(([x = 0, y = 0, z = 0]) => [x, y, -z]) }).measure).toBeCloseTo(-1, 14);
    expect(measured({ type: 10, corners: [[0, 0, 0], [1, 0, 0], [0, 1, 0], [1, 1, 0]] })).toMatchObject({ measure: 0, x: 0.5, y: 0.5, z: 0 });
    expect(measured({ type: 1, corners: [[3, 4, 5]] })).toMatchObject({ measure: 1, x: 3, y: 4, z: 5 });
  });
});
