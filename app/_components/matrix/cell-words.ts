import type { Matrix, MatrixCell } from '@/lib/domain/matrix/schema';
import { formatOrder } from '@/lib/domain/numbers/format-order';
import type { MarkName } from '@/lib/figures/outcome-marks';
import { markOfOutcome } from '../studies/mark-of-outcome';

export type MatrixCase = Matrix['cases'][number];

const words: Record<MarkName, string> = {
  pass: 'pass', fail: 'fail', inconclusive: 'inconclusive', 'not-run': 'not run', exact: 'pass, exact',
  'meets-target': 'meets target', 'misses-target': 'misses target', 'inconclusive-solution': 'inconclusive',
};

/** The mark of a cell; null where no outcome is there, nor missing. */
export function markOfCell(row: MatrixCase, cell: MatrixCell): MarkName | null {
  if (cell.outcome !== null) {
    return cell.exact ? 'exact' : markOfOutcome(cell.outcome, { kind: row.kind });
  }
  return cell.state === 'not-run' ? 'not-run' : null;
}

/** What stands in a cell, in words. */
export function cellOutcome(row: MatrixCase, cell: MatrixCell): string {
  const mark = markOfCell(row, cell);
  if (mark !== null) return [words[mark], cell.waived && 'waived', cell.signed && 'signed'].filter(Boolean).join(', ');
  if (cell.state === 'younger') return 'the case is younger than this release';
  if (cell.state === 'assessment-failed') return 'the assessment could not be made';
  if (cell.gridsRead !== null && cell.gridsPlanned !== null) return `in progress, ${cell.gridsRead} of ${cell.gridsPlanned} grids read`;
  return cell.state;
}

/** The lowest observed order over the formal one, such as 1.02/2. */
export function orderOverFormal({ lowest }: MatrixCell): string | null {
  return lowest === null ? null : `${formatOrder(lowest.observed)}/${lowest.formalOrder}`;
}

/** The accessible name of a cell. */
export function cellLabel(row: MatrixCase, cell: MatrixCell): string {
  const { lowest } = cell;
  const order = lowest === null ? '' : `, order ${formatOrder(lowest.observed)} of ${lowest.formalOrder}`;
  return `${row.name}, ${cell.release}: ${cellOutcome(row, cell)}${order}`;
}
