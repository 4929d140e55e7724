import type { Matrix, MatrixCell } from './schema';

type Counts = Matrix['releases'][number]['counts'];

const countOfOutcome = {
  pass: 'passOrExact', fail: 'fail', inconclusive: 'inconclusive', 'meets-target': 'meetsTarget', 'misses-target': 'missesTarget',
} as const;

/** How many cells have each outcome; without one they are not run or in progress. A younger case is in no count. */
export function countCells(cells: readonly Pick<MatrixCell, 'state' | 'outcome'>[]): Counts {
  const counts: Counts = { passOrExact: 0, meetsTarget: 0, fail: 0, inconclusive: 0, missesTarget: 0, notRun: 0, inProgress: 0 };
  for (const { state, outcome } of cells) {
    if (outcome !== null) counts[countOfOutcome[outcome]] += 1;
    else if (state === 'not-run') counts.notRun += 1;
    else if (state !== 'younger' && state !== 'assessed') counts.inProgress += 1;
  }
  return counts;
}
