import type { ReactNode } from 'react';

/** The buttons of a form, the primary one first. `answer` says what came of the last press. */
export function FormActions({ children, answer }: { children: ReactNode; answer?: ReactNode }) {
  return (
    <div className="form-actions mt-6 flex flex-wrap items-center gap-3">
      {children}
      <span role="status" className="text-note text-graphite">{answer}</span>
    </div>
  );
}
