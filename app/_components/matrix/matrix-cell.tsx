import Link from 'next/link';
import type { KeyboardEvent, ReactNode } from 'react';
import type { MatrixCell } from '@/lib/domain/matrix/schema';
import { Mark } from '../ui/mark';
import { cellLabel, markOfCell, orderOverFormal, type MatrixCase } from './cell-words';

interface MatrixCellViewProps {
  row: MatrixCase;
  cell: MatrixCell;
  /** The page of its study; null where there is none. */
  href: string | null;
  isCurrent: boolean;
  /** Where it stands, for the arrow keys. */
  place: string;
  onRead: () => void;
  onKeyDown: (event: KeyboardEvent) => void;
}

function Content({ row, cell }: { row: MatrixCase; cell: MatrixCell }): ReactNode {
  const mark = markOfCell(row, cell);
  if (mark !== null) {
    const order = orderOverFormal(cell);
    return (
      <>
        <Mark mark={mark} waived={cell.waived} signed={cell.signed} hidden />
        {order && <span className="ml-1 text-code leading-5">{order}</span>}
      </>
    );
  }
  if (cell.state === 'younger') return <span className="text-rule">–</span>;
  if (cell.state === 'assessment-failed') return <span className="text-graphite">stopped</span>;
  return <span className="text-note text-graphite">{cell.gridsRead ?? 0} of {cell.gridsPlanned ?? 0}</span>;
}

/** One case on one release: a link to its study, or a place to read why there is none. */
export function MatrixCellView({ row, cell, href, isCurrent, place, onRead, onKeyDown }: MatrixCellViewProps) {
  const shared = {
    className: 'inline-flex min-h-11 w-full min-w-[52px] items-center justify-center whitespace-nowrap focus-visible:-outline-offset-2 tablet:min-h-7',
    tabIndex: isCurrent ? 0 : -1, 'aria-label': cellLabel(row, cell), 'data-place': place, onFocus: onRead, onMouseEnter: onRead, onKeyDown,
  };
  return (
    <td role="gridcell" className="px-1 py-0.5 text-center align-middle">
      {href === null
        ? <span {...shared} role="note"><Content row={row} cell={cell} /></span>
        : <Link prefetch={false} {...shared} href={href}><Content row={row} cell={cell} /></Link>}
    </td>
  );
}
