import { readNumber } from '@/app/_components/quick-check/parse-table';
import type { UpdateGridInput } from '@/lib/domain/studies/input';
import type { Norm } from '@/lib/numerics/assessment';
import type { Grid, Study } from '@/lib/domain/studies/schema';

/** What can be typed for a grid: the value of a quantity, or the norm of an error that the solver computed. */
export type TypedColumn = { kind: 'value'; name: string; unit: string | null } | { kind: 'error'; field: string; norm: Norm };

export function typedColumns({ definition }: Study): TypedColumn[] {
  return [
    ...definition.quantities.map(({ name, unit }): TypedColumn => ({ kind: 'value', name, unit: unit ?? null })),
    ...definition.fields.flatMap(({ field, norms }) => norms.map(({ norm }): TypedColumn => ({ kind: 'error', field, norm }))),
  ];
}

/** The text of a cell as it was given, trailing zeros and all. */
export function typedText({ values, errors }: Grid, column: TypedColumn): string {
  if (column.kind === 'error') return String(errors?.[column.field]?.[column.norm] ?? '');
  const value = values?.[column.name];
  if (value === undefined) return '';
  if (typeof value === 'number') return String(value);
  const decimals = value.resolution === undefined ? 0 : Math.max(0, -Math.round(Math.log10(value.resolution)));
  return value.value.toFixed(Math.min(100, Math.max(decimals, String(value.value).split('.')[1]?.length ?? 0)));
}

/** A value with the place of its last digit where that is a zero, which a number alone would not tell. */
function valueOf(text: string, value: number) {
  const decimals = /[.,](\d*0)$/.exec(text.trim())?.[1]?.length;
  return decimals === undefined ? value : { value, resolution: Number(`1e-${decimals}`) };
}

type ReadCells = { ok: true; change: UpdateGridInput } | { ok: false; column: number; found: string };

/** The cells of a row as a change of its grid; the first cell that is no number otherwise. */
export function readCells(columns: readonly TypedColumn[], cells: readonly string[]): ReadCells {
  const values: NonNullable<UpdateGridInput['values']> = {};
  const errors: NonNullable<UpdateGridInput['errors']> = {};
  for (const [index, column] of columns.entries()) {
    const text = cells[index] ?? '';
    if (text.trim() === '') continue;
    const number = readNumber(text);
    if (number === null || (column.kind === 'error' && number < 0)) return { ok: false, column: index, found: text };
    if (column.kind === 'value') values[column.name] = valueOf(text, number);
    else errors[column.field] = { ...errors[column.field], [column.norm]: number };
  }
  const has = (kind: TypedColumn['kind']) => columns.some((column) => column.kind === kind);
  return { ok: true, change: { ...(has('value') ? { values } : {}), ...(has('error') ? { errors } : {}) } };
}
