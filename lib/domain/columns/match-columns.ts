import type { ColumnMapping } from './column-mapping';
import { resolveColumn } from './resolve-column';

const coordinates = ['x', 'y', 'z'] as const;
const optional = ['t', 'dx', 'dy', 'dz', 'distance', 'flag'] as const;
const weightNames = ['w', 'weight', 'vol', 'volume', 'area'];

export interface ColumnNeeds {
  dimension: 1 | 2 | 3;
  fields: readonly string[];
  /** Fields whose gradient is asked for too. */
  gradients?: readonly string[];
}

export interface ColumnMatch {
  /** What the names tell by themselves; `weight` is absent where no column or several could be it. */
  found: Partial<ColumnMapping> & { fields: ColumnMapping['fields'] };
  /** What a person must still choose: x y z, weight, names of fields. */
  missing: string[];
  /** The mapping where nothing is missing, else null. */
  mapping: ColumnMapping | null;
}

/** Maps the columns of a header whose names match, case and all. Equal weights are never assumed. */
export function matchColumns(header: readonly string[], needs: ColumnNeeds): ColumnMatch {
  const find = (name: string): string | undefined => {
    const index = resolveColumn(header, name);
    return typeof index === 'number' ? header[index] : undefined;
  };
  const found: ColumnMatch['found'] = { fields: {} };
  const missing: string[] = [];
  for (const field of needs.fields) {
    const column = find(field);
    const gradient = needs.gradients?.includes(field) ? findGradient(field, needs.dimension, find) : null;
    if (gradient !== null) found.fields[field] = column === undefined ? gradient : [column, ...gradient];
    else if (column === undefined) missing.push(field);
    else found.fields[field] = column;
  }
  const taken = new Set(Object.values(found.fields).flat());
  const findFree = (name: string): string | undefined => {
    const column = find(name);
    return column === undefined || taken.has(column) ? undefined : column;
  };

  for (const name of coordinates.slice(0, needs.dimension)) {
    const column = findFree(name);
    if (column === undefined) missing.push(name);
    else found[name] = column;
  }
  for (const name of optional) {
    const column = findFree(name);
    if (column !== undefined) found[name] = column;
  }
  // Beside u and v in three dimensions, or with a unit of its own, w is a velocity.
  const isVelocity = (column: string) => /[[(]/.test(column) || (needs.dimension === 3 && find('u') !== undefined && find('v') !== undefined);
  const weights = weightNames.flatMap((name) => {
    const column = findFree(name);
    return column === undefined || (name === 'w' && isVelocity(column)) ? [] : [column];
  });
  if (weights.length === 1) found.weight = weights[0];
  else missing.push('weight');

  const { x, weight } = found;
  const mapping = missing.length === 0 && x !== undefined && weight !== undefined ? { ...found, x, weight } : null;
  return { found, missing, mapping };
}

/** Columns called T_x, T_y or dTdx, dTdy; null unless every direction has one. */
function findGradient(field: string, dimension: number, find: (name: string) => string | undefined): string[] | null {
  const columns = coordinates.slice(0, dimension).flatMap((axis) => find(`${field}_${axis}`) ?? find(`d${field}d${axis}`) ?? []);
  return columns.length === dimension ? columns : null;
}
