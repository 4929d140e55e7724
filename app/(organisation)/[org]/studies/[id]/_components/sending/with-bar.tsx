import type { ReactNode } from 'react';

/** A bar with its words beside it, and under it where there is little room. */
export function WithBar({ children }: { children: ReactNode }) {
  return <span className="flex flex-wrap items-center gap-x-3 [&>svg]:max-w-36 [&>svg]:min-w-16 [&>svg]:flex-1">{children}</span>;
}
