import type { FoundProblem } from './reason-collector';

/** Times are seldom printed in full: this much of one may be lost. */
const tolerance = 1e-6;

interface BatchOfTimes { rows: number; before: number; lines: Float64Array | null }

export interface TimeCheck {
  /** Looks at the times of a batch; null where no column holds any. */
  note(times: Float64Array | null, batch: BatchOfTimes): void;
  /** The first row of another time than stated and how many there are; `column` is that of the file, from 0. */
  problem(column: number | undefined): { found: FoundProblem; count: number } | null;
}

/** Finds rows whose time is not the one that their grid states: one of the two must be wrong. */
export function createTimeCheck(stated: number | undefined): TimeCheck {
  let first: { time: number; row: number; line: number | null } | null = null;
  let count = 0;
  return {
    note(times, { rows, before, lines }) {
      if (times === null || stated === undefined) return;
      for (let row = 0; row < rows; row += 1) {
        const time = times[row] as number;
        if (Math.abs(time - stated) <= Math.max(tolerance * Math.abs(stated), 1e-12)) continue;
        first ??= { time, row: before + row, line: lines?.[row] ?? null };
        count += 1;
      }
    },
    problem(column) {
      if (first === null) return null;
      const found = `${first.time}${first.line === null ? ` in row ${first.row + 1}` : ''}`;
      const place = { line: first.line, column: column === undefined ? null : column + 1 };
      return { found: { code: 'time-differs', ...place, found, expected: `${stated}, the time stated for the grid` }, count };
    },
  };
}
