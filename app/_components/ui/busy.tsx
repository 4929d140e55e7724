import type { ReactNode } from 'react';
import { ProgressBar } from './progress-bar';

interface BusyProps {
  /** A sentence with counts, and whether the page may be left. */
  children: ReactNode;
  share?: number | null;
  label?: string;
}

/** The place of a result that is still being worked out. */
export function Busy({ children, share = null, label = 'Progress' }: BusyProps) {
  return (
    <div role="status" className="border-y-[1.5px] border-ink py-2">
      <p className="mb-2">{children}</p>
      <ProgressBar label={label} share={share} />
    </div>
  );
}
