import { mostReasons } from '../domain/uploads/most-reasons';
import type { RejectionCode, RejectionReason } from '../domain/uploads/rejection';
import { RejectedFile } from './rejected-file';

const longestFound = 60;

export interface FoundProblem {
  code: RejectionCode;
  line: number | null;
  column: number | null;
  found: string | null;
  expected: string | null;
}

export interface ReasonCollector {
  /** `count` is how many times at once, 1 where not given. */
  add(problem: FoundProblem, count?: number): void;
  isEmpty(): boolean;
  list(): readonly RejectionReason[];
  throwIfAny(): void;
}

/** Keeps the first of each kind of problem per column, in the order of the file, and counts the others. */
export function createReasonCollector(): ReasonCollector {
  const reasons = new Map<string, RejectionReason>();
  return {
    add({ code, line, column, found, expected }, count = 1) {
      // The decimal mark is one question of the whole file, not one per column.
      const kind = code === 'mixed-decimal' ? code : `${code} ${column}`;
      const known = reasons.get(kind);
      if (known !== undefined) known.count += count;
      else if (reasons.size < mostReasons) reasons.set(kind, { code, count, line, column, found: found === null ? null : shorten(found), expected });
    },
    isEmpty: () => reasons.size === 0,
    list: () => [...reasons.values()],
    throwIfAny() {
      if (reasons.size > 0) throw new RejectedFile([...reasons.values()]);
    },
  };
}

/** Throws the one reason for which a file is not read any further, after those collected so far. */
export function rejectAtOnce(reasons: ReasonCollector, problem: FoundProblem): never {
  reasons.add(problem);
  reasons.throwIfAny();
  throw new Error('rejectAtOnce: the collector lost a reason');
}

function shorten(text: string): string {
  return text.length <= longestFound ? text : `${text.slice(0, longestFound)}…`;
}
