import { performance } from 'node:perf_hooks';
import { RejectedFile } from '@/lib/readers/rejected-file';
import type { ReadProgress } from '@/lib/readers/source';

/** A tenth of what a plain solution is read with on a small machine. */
const bytesASecond = 2e6;

/**
 * Ends the reading of a file that has kept this thread computing for longer than is fair to the others: in its exact
 * solution, mostly. Waiting does not count. Throws RejectedFile.
 */
export function createComputeLimit(leastSeconds: number, bytesOfFile: number): (progress: ReadProgress) => void {
  const begun = performance.eventLoopUtilization();
  const allowed = leastSeconds + bytesOfFile / bytesASecond;
  return ({ rows }) => {
    const seconds = performance.eventLoopUtilization(begun).active / 1000;
    if (seconds <= allowed) return;
    throw new RejectedFile([{
      code: 'too-much-computing', count: 1, line: null, column: null, found: `after ${Math.round(seconds)} s at row ${rows}`,
      expected: `at most ${Math.round(allowed)} s for a file of this size`,
    }]);
  };
}
