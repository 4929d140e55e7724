import type { ReactNode } from 'react';

export function PageTitle({ children, under }: { children: ReactNode; under?: ReactNode }) {
  return (
    <header>
      <h1 className="font-serif text-title font-semibold">{children}</h1>
      {under && <p className="mt-1 text-table text-graphite">{under}</p>}
    </header>
  );
}

/** What the page comes to, in one sentence. */
export function Statement({ children, lead }: { children: ReactNode; lead?: ReactNode }) {
  return (
    <div className="mt-6">
      <p className="page-statement font-serif text-statement-phone text-balance tablet:text-statement">{children}</p>
      {lead && <p className="mt-3 max-w-[46em] font-serif text-lead-phone tablet:text-lead">{lead}</p>}
    </div>
  );
}

/** A ruled line under the statement, such as "After data. Grid 1 was added after the first upload." */
export function FlagLine({ children }: { children: ReactNode }) {
  return <p className="mt-4 border-y border-rule py-[7px]">{children}</p>;
}
