import type { CellBatch, CellRows, RefuseCell } from './cell-rows';
import { isStraight } from './grid-columns';
import { arrayKey, describeArray, lengthAlong, type GridFile, type Piece, type Section } from './grid-file';
import { createStoredNumbers, type StoredSegment } from './stored-segment';
import { createCurvedCells, createStraightCells, placeOf, pointsAlong, type Axes, type Axis } from './structured-cells';
import { createUnstructuredCells } from './unstructured-cells';

/** 48 MiB of points: two million, read once each; of larger grids what is used at the same time. */
const pointPlaces = 2048;
/** Two million coordinates along one direction. */
const axisPlaces = 680;

const placesOfPoints = { section: 'Points', name: 'Points' } as const;

export interface PieceAsked {
  file: GridFile;
  /** The piece, from 0. */
  index: number;
  refuse: RefuseCell;
}

const pieceOf = ({ file, index }: PieceAsked): Piece => file.pieces[index] ?? { points: 0, cells: 0, extent: null };

/** The values of an array in a piece; null where the piece does not have it. */
export function findSegment({ file, index }: PieceAsked, section: Section, name: string): StoredSegment | null {
  const array = file.arrays.get(arrayKey({ section, name }));
  const segment = array?.segments[index];
  return array === undefined || segment === undefined ? null : { values: array.values, ...segment };
}

/** The same where it must be there, with so many values at least. */
export function needSegment(asked: PieceAsked, { section, name }: { section: Section; name: string }, least: number): StoredSegment {
  const what = describeArray({ section, name }, asked.index);
  const segment = findSegment(asked, section, name) ?? asked.refuse('malformed-vtk', `no ${what}`, 'the array');
  return segment.length >= least ? segment : asked.refuse('malformed-vtk', `${segment.length} values in ${what}`, `${least} or more`);
}

/** Computes centres of cells; `isMeasured` tells that measures are used too. */
export function createCellRows(asked: PieceAsked, rows: number, isMeasured: boolean): CellRows {
  const { points, extent } = pieceOf(asked);
  if (extent !== null && isStraight(asked.file.kind)) return createStraightCells(extent, axesOf(asked, extent), asked.refuse);
  const coordinates = needSegment(asked, placesOfPoints, 3 * points);
  if (extent !== null) return createCurvedCells(extent, createStoredNumbers(coordinates, pointPlaces));
  const need = (name: string, least: number) => needSegment(asked, { section: 'Cells', name }, least);
  return createUnstructuredCells({
    points, coordinates: createStoredNumbers(coordinates, pointPlaces), connectivity: need('connectivity', 0), offsets: need('offsets', rows), types: need('types', rows),
    faces: findSegment(asked, 'Cells', 'faces'), faceOffsets: findSegment(asked, 'Cells', 'faceoffsets'),
  }, isMeasured, asked.refuse);
}

/** Coordinates of points, in the same places of a batch as centres of cells. */
export function createPointRows(asked: PieceAsked): CellRows {
  const { points, extent } = pieceOf(asked);
  if (extent !== null && isStraight(asked.file.kind)) return straightPoints(extent, axesOf(asked, extent));
  const coordinate = createStoredNumbers(needSegment(asked, placesOfPoints, 3 * points));
  return {
    fill(from, count, into) {
      for (let row = 0; row < count; row += 1) setPlace(into, row, [coordinate(3 * (from + row)), coordinate(3 * (from + row) + 1), coordinate(3 * (from + row) + 2)]);
    },
  };
}

function straightPoints(extent: readonly number[], [x, y, z]: Axes): CellRows {
  const along = pointsAlong(extent);
  return {
    fill(from, count, into) {
      for (let row = 0; row < count; row += 1) {
        const [i, j, k] = placeOf(from + row, along);
        setPlace(into, row, [x(i), y(j), z(k)]);
      }
    },
  };
}

function setPlace(into: CellBatch, row: number, [x, y, z]: readonly [number, number, number]): void {
  into.x[row] = x;
  into.y[row] = y;
  into.z[row] = z;
}

/** The coordinates along each direction of a grid that has such. */
function axesOf(asked: PieceAsked, extent: readonly number[]): Axes {
  const axis = (name: 'x' | 'y' | 'z', place: number): Axis => {
    const { image } = asked.file;
    if (image === null) return createStoredNumbers(needSegment(asked, { section: 'Coordinates', name }, lengthAlong(extent, place)), axisPlaces);
    const [origin = 0, spacing = 1, first = 0] = [image.origin[place], image.spacing[place], extent[2 * place]];
    return (index) => origin + spacing * (first + index);
  };
  return [axis('x', 0), axis('y', 1), axis('z', 2)];
}
