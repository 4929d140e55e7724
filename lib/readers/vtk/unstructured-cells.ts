import { createCellMeasurer } from './cell-measure';
import type { CellRows, RefuseCell } from './cell-rows';
import { findCellShape, nameOtherCell, type CellShape } from './cell-types';
import { createFaceReader } from './polyhedron-faces';
import { createStoredNumbers, type StoredNumbers, type StoredSegment } from './stored-segment';

/** A polygon or polyhedron of more corners than this is taken for damage. */
const mostCorners = 100_000;

export interface UnstructuredPiece {
  points: number;
  /** x y z of each point in turn. */
  coordinates: StoredNumbers;
  connectivity: StoredSegment;
  /** For each cell the end of its points in `connectivity`. */
  offsets: StoredSegment;
  types: StoredSegment;
  /** Of polyhedra: for each cell the end of its faces in `faces`. */
  faces: StoredSegment | null;
  faceOffsets: StoredSegment | null;
}

/** Centres and measures of cells of any types. `isMeasured` tells that measures are used, which cells of one dimension alone share. */
export function createUnstructuredCells(piece: UnstructuredPiece, isMeasured: boolean, refuse: RefuseCell): CellRows {
  const measure = createCellMeasurer();
  const coordinate = piece.coordinates;
  const [corner, offset, type] = [createStoredNumbers(piece.connectivity), createStoredNumbers(piece.offsets), createStoredNumbers(piece.types)];
  const readFaces = createFaceReader(piece, refuse);
  let corners = new Float64Array(3 * 32);
  let ids = new Float64Array(32);
  let first: CellShape | null = null;

  const shapeOf = (cell: number): CellShape => {
    const number = type(cell);
    const shape = findCellShape(number) ?? refuse('unsupported-cell', `${nameOtherCell(number)}, cell ${cell + 1}`, 'cells with straight edges');
    first ??= shape;
    if (isMeasured && shape.dimension !== first.dimension) refuse('mixed-cells', `${shape.name}, cell ${cell + 1}, beside a ${first.name}`, 'cells of one dimension');
    return shape;
  };

  const readCorners = (cell: number, begin: number, shape: CellShape): number => {
    const end = offset(cell);
    const count = end - begin;
    if (!(count >= 0 && end <= piece.connectivity.length)) refuse('malformed-vtk', `offset ${end} after ${begin}, cell ${cell + 1}`, `offsets that rise to ${piece.connectivity.length}`);
    if (count !== shape.corners && !(shape.isOpen && count > shape.corners)) refuse('malformed-vtk', `${count} points of a ${shape.name}, cell ${cell + 1}`, `${shape.corners}${shape.isOpen ? ' or more' : ''}`);
    if (count > mostCorners) refuse('malformed-vtk', `a ${shape.name} of ${count} points, cell ${cell + 1}`, `at most ${mostCorners}`);
    if (corners.length < 3 * count) {
      corners = new Float64Array(6 * count);
      ids = new Float64Array(2 * count);
    }
    for (let at = 0; at < count; at += 1) {
      const id = corner(begin + at);
      if (!(id >= 0 && id < piece.points && Number.isInteger(id))) refuse('malformed-vtk', `point ${id}, cell ${cell + 1}`, `points from 0 to ${piece.points - 1}`);
      ids[at] = id;
      corners[3 * at] = coordinate(3 * id);
      corners[3 * at + 1] = coordinate(3 * id + 1);
      corners[3 * at + 2] = coordinate(3 * id + 2);
    }
    return count;
  };

  return {
    fill(from, count, into) {
      let begin = from === 0 ? 0 : offset(from - 1);
      for (let row = 0; row < count; row += 1) {
        const cell = from + row;
        const shape = shapeOf(cell);
        const used = readCorners(cell, begin, shape);
        begin += used;
        const found = shape.kind === 'polyhedron' ? measure(shape, corners, used, readFaces(cell, ids.subarray(0, used))) : measure(shape, corners, used);
        into.x[row] = found.x;
        into.y[row] = found.y;
        into.z[row] = found.z;
        into.volume[row] = found.measure;
      }
    },
  };
}
