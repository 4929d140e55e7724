import type { Procedure } from '@/lib/numerics/assessment';

/** What the quick check holds while it is typed. */
export interface QuickState {
  holds: 'values' | 'errors';
  spacingAs: 'h' | 'cells' | 'cellsPerDirection';
  dimension: '1' | '2' | '3';
  formalOrder: string;
  knownValue: string;
  /** Largest GCI accepted, as a fraction. */
  target: string;
  procedure: Procedure;
  name: string;
  /** Spacing first, then a value, or the errors in L1, L2, L∞; the last row is always empty. */
  rows: string[][];
}

export const spacingColumns = { h: 'Spacing h', cells: 'Cells in all', cellsPerDirection: 'Cells per direction' } as const;

export const columnsOf = ({ holds, spacingAs }: Pick<QuickState, 'holds' | 'spacingAs'>): string[] =>
  [spacingColumns[spacingAs], ...(holds === 'values' ? ['Value'] : ['L1', 'L2', 'L∞'])];

export const isBlankRow = (row: readonly string[]) => row.every((cell) => cell.trim() === '');

/** Rows up to the last that holds something, and one more to type into. */
export function withEmptyRow(rows: readonly string[][], columns: number): string[][] {
  const last = rows.findLastIndex((row) => !isBlankRow(row));
  const kept = rows.slice(0, last + 1).map((row) => Array.from({ length: columns }, (_, index) => row[index] ?? ''));
  return [...kept, Array<string>(columns).fill('')];
}

export const emptyQuick: QuickState = {
  holds: 'values', spacingAs: 'cellsPerDirection', dimension: '1', formalOrder: '', knownValue: '', target: '', procedure: 'three-grid', name: '', rows: withEmptyRow([], 2),
};

const trapezoid = (cells: number) => Array.from({ length: cells + 1 }, (_, index) => Math.exp(index / cells) * (index === 0 || index === cells ? 0.5 : 1))
  .reduce((sum, part) => sum + part, 0) / cells;

/** The integral of the exponential function over the unit interval by the trapezoidal rule. */
export const exampleQuick: QuickState = {
  ...emptyQuick, formalOrder: '2', name: 'the integral',
  rows: withEmptyRow([8, 16, 32, 64].map((cells) => [String(cells), trapezoid(cells).toFixed(9)]), 2),
};
