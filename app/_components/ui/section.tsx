import type { ReactNode } from 'react';

interface SectionProps {
  heading?: ReactNode;
  id?: string;
  /** Stands in the margin beside the section, and below it where there is no margin. */
  note?: ReactNode;
  /** Holds what can be done, which paper cannot. */
  screenOnly?: boolean;
  children: ReactNode;
}

/** One row of a page: the matter, and beside it the note that explains it. */
export function Section({ heading, id, note, screenOnly, children }: SectionProps) {
  return (
    <section id={id} className={`page-section ${screenOnly ? 'screen-only' : ''}`}>
      <div className="page-main">
        {heading && <h2 className="mb-3 font-serif text-section font-semibold">{heading}</h2>}
        {children}
      </div>
      {note && <div className="page-note flex flex-col gap-2 text-note text-graphite [&_b]:text-ink">{note}</div>}
    </section>
  );
}
