import type { NormProblem } from '../numerics/norms/norm-gatherer';
import type { ColumnPlan } from './plan-columns';
import type { FoundProblem } from './reason-collector';

interface Place { line: number | null; point: string }
interface BatchPlaces {
  /** Rows gathered before this batch. */
  before: number;
  lines: Float64Array | null;
  coordinates: Readonly<Record<string, Float64Array | null>>;
}

export interface RowProblems {
  /** Notes where problems lie that were first seen in this batch, whose arrays are soon used again. */
  note(problems: readonly NormProblem[], batch: BatchPlaces): void;
  /** A problem of rows as a reason; `indices` are the columns of the file in the order of the plan. */
  explain(problem: NormProblem, plan: ColumnPlan, fields: readonly string[], indices: readonly number[]): FoundProblem;
}

/** Leads problems found by row, in what was computed from the columns, back to lines and columns of the file. */
export function createRowProblems(): RowProblems {
  const places = new Map<number, Place>();
  return {
    note(problems, { before, lines, coordinates }) {
      for (const { row } of problems) {
        if (row < before || places.has(row)) continue;
        const at = row - before;
        const point = Object.entries(coordinates).flatMap(([name, values]) => (values ? [`${name} = ${values[at]}`] : []));
        places.set(row, { line: lines?.[at] ?? null, point: point.join(', ') });
      }
    },
    explain({ code, field, row, value }, plan, fields, indices) {
      const { line, point } = places.get(row) ?? { line: null, point: '' };
      const column = (slot: number | null | undefined) => (slot === null || slot === undefined ? null : (indices[slot] ?? 0) + 1);
      const inRow = line === null ? ` in row ${row + 1}` : '';
      switch (code) {
        case 'weight-not-positive':
          return { code, line, column: column(plan.weight), found: `${value}${inRow}`, expected: value > 0 && value < Infinity ? 'a weight of which a double can add up many' : 'a weight above 0' };
        case 'value-not-finite':
          return { code: 'not-finite', line, column: column(plan.fields[fields.indexOf(field ?? '')]), found: `${value}${inRow}`, expected: 'a value whose squares a double can add up' };
        case 'exact-not-finite':
          return { code, line, column: null, found: `${value} for ${field} at ${point}`, expected: 'an exact solution that is finite at every row' };
      }
    },
  };
}
