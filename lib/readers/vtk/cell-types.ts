import type { Faces } from './measure-solid';

/** How a cell is measured. */
export interface CellShape {
  kind: 'point' | 'line' | 'strip' | 'polygon' | 'solid' | 'polyhedron';
  name: string;
  dimension: 0 | 1 | 2 | 3;
  /** The number of corners, the least where `isOpen`. */
  corners: number;
  isOpen: boolean;
  /** The corners one after another around a polygon, where they stand in another order. */
  order: readonly number[] | null;
  /** The faces of a solid, each turning left seen from outside. */
  faces: Faces;
  /** Whether its corners are found in either order, so that the sign of its volume tells nothing. */
  mayTurn: boolean;
}

const shape = (kind: CellShape['kind'], name: string, rest: Pick<CellShape, 'dimension' | 'corners'> & Partial<CellShape>): CellShape => (
  { kind, name, isOpen: false, order: null, faces: [], mayTurn: false, ...rest }
);
const solid = (name: string, faces: Faces, mayTurn = false): CellShape => shape('solid', name, { dimension: 3, corners: Math.max(...faces.flat()) + 1, faces, mayTurn });

const box: Faces = [[0, 3, 2, 1], [4, 5, 6, 7], [0, 1, 5, 4], [1, 2, 6, 5], [2, 3, 7, 6], [3, 0, 4, 7]];
/** Corners of a pixel and a voxel run along x first, those of a quad and a hexahedron around. */
const around = [0, 1, 3, 2, 4, 5, 7, 6];

/** The faces between a base of n corners and a top of as many. */
function prism(corners: number): Faces {
  const ring = Array.from({ length: corners }, (_, at) => at);
  const sides = ring.map((at) => [at, (at + 1) % corners, corners + ((at + 1) % corners), corners + at]);
  return [[...ring].reverse(), ring.map((at) => corners + at), ...sides];
}

/** By their numbers in VTK files. The triangle of a wedge is found on either side, as documents differ. */
const shapes: Readonly<Record<number, CellShape>> = {
  1: shape('point', 'vertex', { dimension: 0, corners: 1 }),
  3: shape('line', 'line', { dimension: 1, corners: 2 }),
  4: shape('line', 'polyline', { dimension: 1, corners: 2, isOpen: true }),
  5: shape('polygon', 'triangle', { dimension: 2, corners: 3 }),
  6: shape('strip', 'triangle strip', { dimension: 2, corners: 3, isOpen: true }),
  7: shape('polygon', 'polygon', { dimension: 2, corners: 3, isOpen: true }),
  8: shape('polygon', 'pixel', { dimension: 2, corners: 4, order: around }),
  9: shape('polygon', 'quad', { dimension: 2, corners: 4 }),
  10: solid('tetrahedron', [[0, 2, 1], [0, 1, 3], [1, 2, 3], [2, 0, 3]]),
  11: solid('voxel', box.map((face) => face.map((corner) => around[corner] ?? 0))),
  12: solid('hexahedron', box),
  13: solid('wedge', prism(3), true),
  14: solid('pyramid', [[0, 3, 2, 1], [0, 1, 4], [1, 2, 4], [2, 3, 4], [3, 0, 4]]),
  15: solid('pentagonal prism', prism(5), true),
  16: solid('hexagonal prism', prism(6), true),
  42: shape('polyhedron', 'polyhedron', { dimension: 3, corners: 4, isOpen: true }),
};

const others: Readonly<Record<number, string>> = {
  0: 'empty cell', 2: 'cell of several vertices', 21: 'quadratic edge', 22: 'quadratic triangle', 23: 'quadratic quad', 24: 'quadratic tetrahedron',
  25: 'quadratic hexahedron', 26: 'quadratic wedge', 27: 'quadratic pyramid', 28: 'biquadratic quad', 29: 'triquadratic hexahedron',
  30: 'quadratic linear quad', 31: 'quadratic linear wedge', 32: 'biquadratic quadratic wedge', 33: 'biquadratic quadratic hexahedron',
  34: 'biquadratic triangle', 35: 'cubic line', 36: 'quadratic polygon', 37: 'triquadratic pyramid', 41: 'convex point set',
};

export function findCellShape(type: number): CellShape | undefined {
  return shapes[type];
}

/** What a cell is called of which no measure is computed. */
export function nameOtherCell(type: number): string {
  if (type >= 60 && type <= 67) return `higher-order cell (type ${type})`;
  if (type >= 68 && type <= 74) return `Lagrange cell (type ${type})`;
  if (type >= 75 && type <= 81) return `Bézier cell (type ${type})`;
  return others[type] ?? `cell of type ${type}`;
}
