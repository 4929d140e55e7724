/**
 * The index of the column that a name means: the column of that very name, else the one whose path (parts joined by `/`
 * or `.`) ends in it, else the same with a unit in brackets after it. `absent` where there is none, `ambiguous` where
 * there are several.
 */
export function resolveColumn(header: readonly string[], name: string): number | 'absent' | 'ambiguous' {
  const found = readings.map((reading) => indicesWhere(header, (column) => reading(column) === name)).find(({ length }) => length > 0) ?? [];
  if (found.length > 1) return 'ambiguous';
  return found[0] ?? 'absent';
}

/** A unit, and no index: “u [m/s]” is u, “u[0]” is not. */
const unit = /\s*(?:\[(?!\s*\d+\s*\])[^\]]*\]|\((?!\s*\d+\s*\))[^)]*\))$/;
const withoutUnit = (column: string): string => column.replace(unit, '');
const readings = [(column: string) => column, lastPart, withoutUnit, (column: string) => lastPart(withoutUnit(column))] as const;

function indicesWhere(header: readonly string[], matches: (column: string) => boolean): number[] {
  return header.flatMap((column, index) => (matches(column) ? [index] : []));
}

function lastPart(column: string): string {
  return column.slice(Math.max(column.lastIndexOf('/'), column.lastIndexOf('.')) + 1);
}
