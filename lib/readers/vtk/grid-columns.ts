import type { ArrayName, GridFile } from './grid-file';

export type Geometry = 'x' | 'y' | 'z' | 'volume' | 'dx' | 'dy' | 'dz';

/** A column as a file of VTK offers it; `of` is what it has a row for. */
export interface GridColumn {
  name: string;
  of: 'points' | 'cells' | 'both';
  source: { kind: 'geometry'; what: Geometry } | { kind: 'time' } | { kind: 'array'; array: ArrayName; component: number };
}

/** Marks what several pieces or levels of refinement have twice. */
export const ghostNames = ['vtkGhostType', 'vtkGhostLevels'];
export const timeName = 'TimeValue';

/**
 * All columns: coordinates of points, or centres of cells with their volume, under bare names; `t` where the file states a time;
 * then arrays by path, `points/p`, `cells/U[0]`.
 */
export function listColumns({ kind, listed }: Pick<GridFile, 'kind' | 'listed'>): GridColumn[] {
  const data = listed.filter(({ section, name }) => section !== 'FieldData' && !ghostNames.includes(name));
  const hasCells = data.some(({ section }) => section === 'CellData');
  const geometry = (what: Geometry, of: GridColumn['of']): GridColumn => ({ name: what, of, source: { kind: 'geometry', what } });
  return [
    ...(['x', 'y', 'z'] as const).map((axis) => geometry(axis, 'both')),
    ...(hasCells ? [geometry('volume', 'cells')] : []),
    ...(hasCells && isStraight(kind) ? (['dx', 'dy', 'dz'] as const).map((size) => geometry(size, 'cells')) : []),
    ...(listed.some(isTime) ? [{ name: 't', of: 'both', source: { kind: 'time' } } satisfies GridColumn] : []),
    ...data.flatMap(columnsOfArray),
  ];
}

/** Whether cells are boxes along the axes. */
export const isStraight = (kind: GridFile['kind']): boolean => kind === 'RectilinearGrid' || kind === 'ImageData';

export const isTime = ({ section, name }: Pick<ArrayName, 'section' | 'name'>): boolean => section === 'FieldData' && name === timeName;

export function columnsOfArray(array: ArrayName): GridColumn[] {
  const of = array.section === 'PointData' ? 'points' : 'cells';
  return Array.from({ length: array.components }, (_, component) => ({
    name: `${of}/${array.name}${array.components > 1 ? `[${component}]` : ''}`, of, source: { kind: 'array', array, component },
  }));
}
