import type { ComponentProps, ReactNode } from 'react';

interface TableProps extends Omit<ComponentProps<'table'>, 'title'> {
  /** The number in "Table 1."; left out where a page holds a single unnumbered list. */
  number?: number;
  caption: ReactNode;
  /** The caption is spoken only, where a heading right above says the same. */
  hideCaption?: boolean;
  children: ReactNode;
}

/** A table between two heavy rules. It scrolls inside itself on a phone; its caption does not. */
export function Table({ number, caption, hideCaption, children, className = '', id, ...table }: TableProps) {
  const name = <>{number !== undefined && <b>Table {number}. </b>}{caption}</>;
  return (
    <figure id={id}>
      {!hideCaption && <figcaption className="mb-2 font-serif text-caption">{name}</figcaption>}
      <div className="relative overflow-x-auto border-y-[1.5px] border-ink" role="group" tabIndex={0} aria-label="Table, scrolls sideways">
        <table {...table} className={`w-full border-collapse text-table ${className}`}>
          <caption className="sr-only">{name}</caption>
          {children}
        </table>
      </div>
    </figure>
  );
}

export function Head({ children }: { children: ReactNode }) {
  return <thead className="border-b border-rule text-head text-graphite">{children}</thead>;
}

interface RowProps extends ComponentProps<'tr'> {
  /** The first row of a group stands under a stronger rule. */
  startsGroup?: boolean;
  /** Answers to the pointer, where the row leads somewhere. */
  isLinked?: boolean;
  /** Belongs to the row above it: no rule between. */
  continues?: boolean;
}

export function Row({ startsGroup, isLinked, continues, className = '', ...row }: RowProps) {
  const rule = continues ? '' : `border-t first:border-t-0 ${startsGroup ? 'border-rule' : 'border-hairline'}`;
  return <tr {...row} className={`${rule} ${isLinked ? 'hover:bg-wash' : ''} ${className}`} />;
}
