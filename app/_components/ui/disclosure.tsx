import type { ReactNode } from 'react';

export function Disclosure({ summary, children, open }: { summary: ReactNode; children: ReactNode; open?: boolean }) {
  return (
    <details open={open} className="group">
      <summary className="flex min-h-11 cursor-pointer list-none items-center text-pen tablet:min-h-9 [&::-webkit-details-marker]:hidden">
        <span className="underline decoration-pen/40 underline-offset-3 group-hover:decoration-pen">{summary}</span>
      </summary>
      <div className="pb-3">{children}</div>
    </details>
  );
}
