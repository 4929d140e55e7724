import { assessQuickCheck } from '@/lib/domain/assessment/quick-check';
import { quickCheckSchema, type QuickCheckInput } from '@/lib/domain/assessment/quick-schema';
import type { FieldProblem } from '@/lib/errors';
import type { SeriesAssessment } from '@/lib/numerics/assessment';
import { readNumber } from './parse-table';
import { isBlankRow, type QuickState } from './quick-state';

export interface CellFault { row: number; column: number; message: string }

type HeldTo = 'formalOrder' | 'knownValue' | 'target';

export interface QuickReading {
  input: QuickCheckInput | null;
  assessment: SeriesAssessment | null;
  cells: CellFault[];
  /** Faults of the fields above the table, by their name. */
  fields: Partial<Record<HeldTo, string>>;
  /** What each row is called: 1 is the finest grid, as far as the spacings can be read. */
  labels: string[];
  /** What concerns the table as a whole. */
  table: string[];
}

const norms = ['L1', 'L2', 'Linf'] as const;

/** One unit of the last digit typed, so that a zero at the end says something too. */
function lastDigit(text: string): number | undefined {
  const [, decimals = '', exponent = '0'] = /[.,](\d+)(?:[eEdD]([+-]?\d+))?$/.exec(text.trim()) ?? [];
  return decimals === '' ? undefined : 10 ** (Number(exponent) - decimals.length);
}

function cellsPerDirection(text: string): number | number[] | null {
  const counts = text.split(/[x×*]/i).map(readNumber);
  if (counts.some((count) => count === null)) return null;
  return counts.length === 1 ? (counts[0] ?? null) : (counts as number[]);
}

function readSpacing(row: readonly string[], { spacingAs }: QuickState): number | number[] | null {
  return spacingAs === 'cellsPerDirection' ? cellsPerDirection(row[0] ?? '') : readNumber(row[0] ?? '');
}

/** Grids by fineness; blank rows have no name, and where a spacing cannot be read the rows count downwards. */
function labelRows(state: QuickState): string[] {
  const finenessOf = (row: readonly string[]) => {
    const stated = readSpacing(row, state);
    const size = Array.isArray(stated) ? stated.reduce((product, count) => product * count, 1) : stated;
    return size === null || state.spacingAs !== 'h' ? size : -size;
  };
  const typed = state.rows.filter((row) => !isBlankRow(row)).map((row) => ({ row, fineness: finenessOf(row) }));
  const areAllRead = typed.every(({ fineness }) => fineness !== null);
  const order = areAllRead ? typed.toSorted((a, b) => (b.fineness ?? 0) - (a.fineness ?? 0)) : typed.toReversed();
  return state.rows.map((row) => (isBlankRow(row) ? '' : String(order.findIndex((each) => each.row === row) + 1)));
}

function readRow(row: readonly string[], at: { row: number; label: string }, state: QuickState, faults: CellFault[]): unknown {
  const [spacing = '', ...rest] = row;
  const { label } = at;
  const stated = readSpacing(row, state);
  const expected = (column: number, text: string) => faults.push({ row: at.row, column, message: text.trim() === '' ? 'Missing. Expected a number.' : `Not a number. Found “${text.trim()}”.` });
  if (stated === null) expected(0, spacing);
  const numbers = rest.map((text, index) => {
    const value = readNumber(text);
    if (value === null && (text.trim() !== '' || state.holds === 'values')) expected(index + 1, text);
    return value;
  });
  if (state.holds === 'values') return { label, [state.spacingAs]: stated, value: numbers[0] ?? undefined, resolution: lastDigit(rest[0] ?? '') };
  const errors = norms.flatMap((norm, index) => (typeof numbers[index] === 'number' ? [[norm, numbers[index]]] : []));
  return { label, [state.spacingAs]: stated, errors: Object.fromEntries(errors) as Record<string, unknown> };
}

function placeFault({ path, message }: FieldProblem, rowsTyped: readonly number[], reading: QuickReading): void {
  const [list, at, member, norm] = path.split('.');
  if (list === 'formalOrder' || list === 'knownValue' || list === 'target') reading.fields[list] = message;
  else if (list === 'grids' && at !== undefined) {
    const column = member === 'value' ? 1 : member === 'errors' && norm ? norms.findIndex((each) => each === norm) + 1 : 0;
    reading.cells.push({ row: rowsTyped[Number(at)] ?? 0, column, message });
  } else reading.table.push(message);
}

/** What was typed, as POST /assess would take it, and what comes of it; or what is wrong with it, cell by cell. */
export function readQuick(state: QuickState): QuickReading {
  const reading: QuickReading = { input: null, assessment: null, cells: [], fields: {}, table: [], labels: labelRows(state) };
  const rowsTyped = state.rows.flatMap((row, index) => (isBlankRow(row) ? [] : [index]));
  if (rowsTyped.length < 2) return reading;
  const grids = rowsTyped.map((at) => readRow(state.rows[at] ?? [], { row: at, label: reading.labels[at] ?? '' }, state, reading.cells));
  const optional = (name: HeldTo) => {
    if (state[name].trim() === '') return undefined;
    const value = readNumber(state[name]);
    if (value === null) reading.fields[name] = `Not a number. Found “${state[name].trim()}”.`;
    return value ?? undefined;
  };
  const formalOrder = optional('formalOrder');
  const knownValue = state.holds === 'values' ? optional('knownValue') : undefined;
  const target = state.holds === 'values' ? optional('target') : undefined;
  if (reading.cells.length > 0 || Object.keys(reading.fields).length > 0) return reading;
  const parsed = quickCheckSchema.safeParse({ dimension: Number(state.dimension), grids, formalOrder, knownValue, target, procedure: state.holds === 'values' ? state.procedure : undefined });
  if (!parsed.success) {
    for (const issue of parsed.error.issues) placeFault({ path: issue.path.join('.'), message: issue.message }, rowsTyped, reading);
    return reading;
  }
  const name = state.name.trim() === '' ? (state.holds === 'values' ? 'the quantity' : 'u') : state.name.trim();
  const result = assessQuickCheck(parsed.data, name);
  if (result.ok) return { ...reading, input: parsed.data, assessment: result.assessment };
  for (const fault of result.faults) placeFault(fault, rowsTyped, reading);
  return reading;
}
