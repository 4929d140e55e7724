import { createReasonCollector, type ReasonCollector } from './reason-collector';
import { createTimeCheck, type TimeCheck } from './time-check';

/** What is wrong with a file, as far as it was read. */
export interface GridChecks {
  /** Of rows, as text. */
  rows: ReasonCollector;
  /** Of values, weights and exact values. */
  values: ReasonCollector;
  times: TimeCheck;
  isClean(): boolean;
  /** Throws RejectedFile with all of it, what is wrong with rows first. `timeColumn` is that of the file, from 0. */
  throwIfAny(timeColumn: number | undefined): void;
}

export function createGridChecks(statedTime: number | undefined): GridChecks {
  const rows = createReasonCollector();
  const values = createReasonCollector();
  const times = createTimeCheck(statedTime);
  return {
    rows, values, times,
    isClean: () => rows.isEmpty() && values.isEmpty() && times.problem(undefined) === null,
    throwIfAny(timeColumn) {
      for (const reason of values.list()) rows.add(reason, reason.count);
      const otherTime = times.problem(timeColumn);
      if (otherTime !== null) rows.add(otherTime.found, otherTime.count);
      rows.throwIfAny();
    },
  };
}
