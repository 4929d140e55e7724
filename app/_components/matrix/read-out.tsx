import type { Matrix, MatrixCell } from '@/lib/domain/matrix/schema';
import { formatOrder } from '@/lib/domain/numbers/format-order';
import { norms, type SeriesNorm } from '@/lib/numerics/assessment';
import { DateTime } from '../ui/date-time';
import { Mark } from '../ui/mark';
import { NormSymbol, Sym } from '../ui/symbols';
import { cellOutcome, markOfCell, type MatrixCase } from './cell-words';

interface ReadOutProps { row: MatrixCase; cell: MatrixCell; worse: Matrix['worse'] }

function seriesNorm(norm: string): SeriesNorm {
  return norms.find((each) => each === norm) ?? 'value';
}

/** What the cell under the pointer or the keyboard says, in a line that is always there. */
export function ReadOut({ row, cell, worse }: ReadOutProps) {
  const mark = markOfCell(row, cell);
  const { lowest } = cell;
  const change = worse.find((entry) => entry.case === row.slug && entry.after === cell.release);
  const isOpen = cell.outcome !== null && (cell.state === 'collecting' || cell.state === 'assessing');
  return (
    <p className="mt-4 flex gap-3 border-y border-rule py-[7px]">
      {mark && <span className="shrink-0"><Mark mark={mark} waived={cell.waived} signed={cell.signed} lineStart hidden /></span>}
      <span>
        <b>{row.name}, {cell.release}: {cellOutcome(row, cell)}.</b>
        {lowest && (
          <> {seriesNorm(lowest.norm) === 'value' ? lowest.field : <><NormSymbol norm={seriesNorm(lowest.norm)} /> of <Sym>{lowest.field}</Sym></>}: observed {formatOrder(lowest.observed)}, formal {lowest.formalOrder}.</>
        )}
        {change && <> Error {change.ratio >= 9.95 ? Math.round(change.ratio) : change.ratio.toFixed(2)} times that of {change.before}.</>}
        {cell.assessedAt && <> Assessed <DateTime value={cell.assessedAt} />{isOpen ? ', a new revision is under way' : ''}.</>}
      </span>
    </p>
  );
}
