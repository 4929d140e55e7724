import type { StoredColumn } from '../column-store';

export type GridKind = 'UnstructuredGrid' | 'RectilinearGrid' | 'StructuredGrid' | 'ImageData';
export type Section = 'PointData' | 'CellData' | 'Points' | 'Cells' | 'Coordinates' | 'FieldData';

/** A part of the grid with points and cells of its own; pieces are put together. */
export interface Piece {
  points: number;
  cells: number;
  /** First and last point along x, y and z of a grid that has such directions. */
  extent: readonly number[] | null;
}

export interface ArrayName { section: Section; name: string; components: number }

/** An array of all pieces, those values of it that are kept. */
export interface StoredArray extends ArrayName {
  values: StoredColumn;
  /** Where the values of each piece stand, undefined for a piece without the array. */
  segments: ({ from: number; length: number } | undefined)[];
  /** Most significant digits of its numbers, null where one is not written in decimal. */
  digits: number | null;
  /** Whether it is stored as float32. */
  isSingle: boolean;
  /** The first text in the place of a number, and how many there are. */
  word: { text: string; line: number; row: number; count: number } | null;
}

/** What a file of VTK says of itself, and the arrays asked for. */
export interface GridFile {
  kind: GridKind;
  pieces: Piece[];
  /** Arrays with values in the points and cells of the first piece, and in the file as a whole. */
  listed: ArrayName[];
  arrays: Map<string, StoredArray>;
  /** Of a grid whose points stand at equal distances. */
  image: { origin: readonly number[]; spacing: readonly number[] } | null;
}

export const arrayKey = ({ section, name }: Pick<ArrayName, 'section' | 'name'>): string => `${section}/${name}`;

/** What an array is called to people. */
export function describeArray({ section, name }: Pick<ArrayName, 'section' | 'name'>, piece: number): string {
  const of = { PointData: `“${name}” of points`, CellData: `“${name}” of cells`, Points: 'Points', Cells: `“${name}” of Cells`, Coordinates: `Coordinates ${name}`, FieldData: `“${name}”` }[section];
  return piece > 0 ? `${of}, piece ${piece + 1}` : of;
}

/** How many values an array has in a piece; null where the piece does not tell. */
export function expectedValues({ section, name, components }: ArrayName, { points, cells, extent }: Piece): number | null {
  switch (section) {
    case 'PointData': return points * components;
    case 'CellData': return cells * components;
    case 'Points': return points * 3;
    case 'Cells': return cells > 0 && (name === 'connectivity' || name === 'faces') ? null : cells;
    case 'Coordinates': return extent === null ? null : lengthAlong(extent, ['x', 'y', 'z'].indexOf(name));
    case 'FieldData': return null;
  }
}

/** Points along a direction, 0 for x. */
export function lengthAlong(extent: readonly number[], axis: number): number {
  return (extent[2 * axis + 1] ?? 0) - (extent[2 * axis] ?? 0) + 1;
}
