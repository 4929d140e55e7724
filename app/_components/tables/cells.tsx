import type { ComponentProps, ReactNode } from 'react';

const sides = 'pr-3 last:pr-0';

interface CellProps extends ComponentProps<'td'> { num?: boolean; afterNumber?: boolean }

/** A cell: numbers right aligned, text after a number set 14 px further in. */
export function Cell({ num, afterNumber, className = '', ...cell }: CellProps) {
  return (
    <td
      {...cell}
      className={`${sides} pt-1 pb-[3px] align-baseline ${num ? 'text-right whitespace-nowrap' : ''} ${afterNumber ? 'pl-[14px]' : ''} ${className}`}
    />
  );
}

interface HeadCellProps extends ComponentProps<'th'> { num?: boolean; afterNumber?: boolean; ofGroup?: boolean }

/** A head; `ofGroup` stands over several columns with a hairline under it. */
export function HeadCell({ num, afterNumber, ofGroup, className = '', scope, children, ...cell }: HeadCellProps) {
  return (
    <th
      {...cell}
      scope={scope ?? (ofGroup ? 'colgroup' : 'col')}
      className={`${sides} pt-1.5 align-bottom font-normal ${ofGroup ? 'pb-0' : 'pb-1.5'} ${num ? 'text-right' : 'text-left'} ${afterNumber || ofGroup ? 'pl-[14px]' : ''} ${className}`}
    >
      {ofGroup ? <span className="block border-b border-hairline pb-1">{children}</span> : children}
    </th>
  );
}

/** The name that a row is about. */
export function RowHead({ className = '', ...cell }: ComponentProps<'th'>) {
  // A head without text is announced as an empty one; where the row above already named the group it is a plain cell.
  if (cell.children === undefined || cell.children === null) return <td />;
  return <th scope="row" {...cell} className={`${sides} pt-1 pb-[3px] text-left align-baseline font-normal ${className}`} />;
}

/** A row that names the group under it. */
export function GroupRow({ columns, children }: { columns: number; children: ReactNode }) {
  return (
    <tr className="border-t border-rule first:border-t-0">
      <th scope="rowgroup" colSpan={columns} className="pt-3 pb-[3px] text-left font-serif text-group font-semibold">{children}</th>
    </tr>
  );
}

/** Why, on a line of its own under the row it explains; `before` columns stay empty. */
export function ReasonRow({ before = 0, columns, children }: { before?: number; columns: number; children: ReactNode }) {
  return (
    <tr>
      {before > 0 && <td colSpan={before} />}
      <td colSpan={columns - before} className="pb-2 text-reason text-graphite">
        <span className="sticky left-0 block max-tablet:max-w-[calc(100vw-112px)]">{children}</span>
      </td>
    </tr>
  );
}

/** A value that is not there; the reason is in the accessible name. */
export function Missing({ reason }: { reason: string }) {
  return (
    <span title={reason} className="text-graphite">
      <span aria-hidden>–</span>
      <span className="sr-only">{reason}</span>
    </span>
  );
}
