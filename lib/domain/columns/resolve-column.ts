/**
 * The index of the column that a name means: the column of that very name, else the one whose path (parts joined by `/`
 * or `.`) ends in it. `absent` where there is none, `ambiguous` where there are several.
 */
export function resolveColumn(header: readonly string[], name: string): number | 'absent' | 'ambiguous' {
  const exact = indicesWhere(header, (column) => column === name);
  const found = exact.length > 0 ? exact : indicesWhere(header, (column) => lastPart(column) === name);
  if (found.length > 1) return 'ambiguous';
  return found[0] ?? 'absent';
}

function indicesWhere(header: readonly string[], matches: (column: string) => boolean): number[] {
  return header.flatMap((column, index) => (matches(column) ? [index] : []));
}

function lastPart(column: string): string {
  return column.slice(Math.max(column.lastIndexOf('/'), column.lastIndexOf('.')) + 1);
}
