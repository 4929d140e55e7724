import type { ReactNode } from 'react';

interface EmptyStateProps {
  /** What belongs here. */
  children: ReactNode;
  /** What is needed for an outcome. */
  needed?: ReactNode;
  actions?: ReactNode;
}

function TwoGrids() {
  return (
    <svg width="112" height="55" viewBox="0 0 112 55" aria-hidden className="shrink-0 stroke-hairline" fill="none">
      <path d="M.5.5h54v54H.5zM27.5.5v54M.5 27.5h54" />
      <path d="M57.5.5h54v54h-54zM71.5.5v54M84.5.5v54M98.5.5v54M57.5 14.5h54M57.5 27.5h54M57.5 41.5h54" />
    </svg>
  );
}

export function EmptyState({ children, needed, actions }: EmptyStateProps) {
  return (
    <div className="flex flex-col gap-x-7 gap-y-4 border-y-[1.5px] border-ink py-4 tablet:flex-row">
      <TwoGrids />
      <div>
        <p>{children}</p>
        {needed && <p className="text-graphite">{needed}</p>}
        {actions && <div className="mt-4 flex flex-wrap gap-3">{actions}</div>}
      </div>
    </div>
  );
}
