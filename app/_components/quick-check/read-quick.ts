import { assessQuickCheck } from '@/lib/domain/assessment/quick-check';
import { quickCheckSchema, type QuickCheckInput } from '@/lib/domain/assessment/quick-schema';
import type { FieldProblem } from '@/lib/errors';
import type { SeriesAssessment } from '@/lib/numerics/assessment';
import { readNumber } from './parse-table';
import { isBlankRow, type QuickState } from './quick-state';

export interface CellFault { row: number; column: number; message: string }

export interface QuickReading {
  input: QuickCheckInput | null;
  assessment: SeriesAssessment | null;
  cells: CellFault[];
  /** Faults of the fields above the table, by their name. */
  fields: Partial<Record<'formalOrder' | 'knownValue', string>>;
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

function readRow(row: readonly string[], at: number, state: QuickState, faults: CellFault[]): unknown {
  const [spacing = '', ...rest] = row;
  const stated = state.spacingAs === 'cellsPerDirection' ? cellsPerDirection(spacing) : readNumber(spacing);
  const expected = (column: number, text: string) => faults.push({ row: at, column, message: text.trim() === '' ? 'Missing. Expected a number.' : `Not a number. Found “${text.trim()}”.` });
  if (stated === null) expected(0, spacing);
  const numbers = rest.map((text, index) => {
    const value = readNumber(text);
    if (value === null && (text.trim() !== '' || state.holds === 'values')) expected(index + 1, text);
    return value;
  });
  const label = String(at + 1);
  if (state.holds === 'values') return { label, [state.spacingAs]: stated, value: numbers[0] ?? undefined, resolution: lastDigit(rest[0] ?? '') };
  const errors = norms.flatMap((norm, index) => (typeof numbers[index] === 'number' ? [[norm, numbers[index]]] : []));
  return { label, [state.spacingAs]: stated, errors: Object.fromEntries(errors) as Record<string, unknown> };
}

function placeFault({ path, message }: FieldProblem, rowsTyped: readonly number[], reading: QuickReading): void {
  const [list, at, member, norm] = path.split('.');
  if (list === 'formalOrder' || list === 'knownValue') reading.fields[list] = message;
  else if (list === 'grids' && at !== undefined) {
    const column = member === 'value' ? 1 : member === 'errors' && norm ? norms.findIndex((each) => each === norm) + 1 : 0;
    reading.cells.push({ row: rowsTyped[Number(at)] ?? 0, column, message });
  } else reading.table.push(message);
}

/** What was typed, as POST /assess would take it, and what comes of it; or what is wrong with it, cell by cell. */
export function readQuick(state: QuickState): QuickReading {
  const reading: QuickReading = { input: null, assessment: null, cells: [], fields: {}, table: [] };
  const rowsTyped = state.rows.flatMap((row, index) => (isBlankRow(row) ? [] : [index]));
  if (rowsTyped.length < 2) return reading;
  const grids = rowsTyped.map((at) => readRow(state.rows[at] ?? [], at, state, reading.cells));
  const optional = (name: 'formalOrder' | 'knownValue') => {
    if (state[name].trim() === '') return undefined;
    const value = readNumber(state[name]);
    if (value === null) reading.fields[name] = `Not a number. Found “${state[name].trim()}”.`;
    return value ?? undefined;
  };
  const formalOrder = optional('formalOrder');
  const knownValue = state.holds === 'values' ? optional('knownValue') : undefined;
  if (reading.cells.length > 0 || Object.keys(reading.fields).length > 0) return reading;
  const parsed = quickCheckSchema.safeParse({ dimension: Number(state.dimension), grids, formalOrder, knownValue });
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
