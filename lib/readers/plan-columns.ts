import type { GridReading } from './grid-reading';

/** Which columns to read, each once, and where among them everything stands. */
export interface ColumnPlan {
  names: string[];
  x: number;
  y: number | null;
  z: number | null;
  t: number | null;
  weight: number | null;
  fields: number[];
  /** Columns of the size of the cell along x, y and z; none unless the file holds averages. */
  extents: number[];
  /** Distance from the boundary and flag of rows that lie there; null unless a band needs them. */
  distance: number | null;
  flag: number | null;
}

/** Lays out what a grid needs of its file. Throws TypeError where the mapping leaves something needed without a column. */
export function planColumns({ mapping, problem, fields, average, bands }: GridReading): ColumnPlan {
  const names: string[] = [];
  const place = (name: string): number => {
    const at = names.indexOf(name);
    return at >= 0 ? at : names.push(name) - 1;
  };
  const need = (what: string, name: string | undefined): number => {
    if (name === undefined) throw new TypeError(`readGrid: the mapping has no column for ${what}`);
    return place(name);
  };
  return {
    names,
    x: place(mapping.x),
    y: problem.dimension >= 2 ? need('y', mapping.y) : null,
    z: problem.dimension === 3 ? need('z', mapping.z) : null,
    t: mapping.t === undefined ? null : place(mapping.t),
    weight: mapping.weight === null ? null : place(mapping.weight),
    fields: fields.map(({ field }) => need(field, mapping.fields[field])),
    extents: average?.extents === null ? (['dx', 'dy', 'dz'] as const).slice(0, problem.dimension).map((name) => need(name, mapping[name])) : [],
    distance: bands?.distance === 'column' ? need('distance', mapping.distance) : null,
    flag: bands?.bands.some(({ test }) => test.by === 'flag') ? need('flag', mapping.flag) : null,
  };
}
