'use client';

import { useId, useState, type ReactNode } from 'react';

interface ProvenanceProps { title?: string; children: ReactNode }

/** Who, when, which revision: open in the margin, a line to unfold where there is no margin. */
export function Provenance({ title = 'Provenance', children }: ProvenanceProps) {
  const [isOpen, setIsOpen] = useState(false);
  const bodyId = useId();
  return (
    <div>
      <button
        type="button"
        aria-expanded={isOpen}
        aria-controls={bodyId}
        onClick={() => setIsOpen(!isOpen)}
        className="flex min-h-11 w-full cursor-pointer items-center justify-between border-y border-hairline text-left text-ink wide:hidden print:hidden"
      >
        {title}
        <span aria-hidden className="text-graphite">{isOpen ? '−' : '+'}</span>
      </button>
      <div id={bodyId} className={isOpen ? 'pt-2 wide:pt-0' : 'hidden wide:block print:block'}>{children}</div>
    </div>
  );
}
