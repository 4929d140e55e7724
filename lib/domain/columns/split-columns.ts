/** The column of a field's values and those of its gradient, as mapped: one column, those of the gradient, or both in that order. */
export function splitColumns(mapped: string | readonly string[] | undefined, dimension: number): { value: string | undefined; gradient: readonly string[] } {
  if (mapped === undefined || typeof mapped === 'string') return { value: mapped, gradient: [] };
  return mapped.length > dimension ? { value: mapped[0], gradient: mapped.slice(1) } : { value: undefined, gradient: mapped };
}
