import type { ReactNode } from 'react';

interface NoticeProps {
  /** The first words, in bold: what did not happen. */
  title: string;
  children?: ReactNode;
  /** What belongs to the words and is no text, such as a table. */
  below?: ReactNode;
  /** The way on. */
  actions?: ReactNode;
}

/** Something was refused: a rule of fail, what happened and when, then the way on. */
export function Notice({ title, children, below, actions }: NoticeProps) {
  return (
    <div role="alert" className="border-b border-t-3 border-b-rule border-t-fail py-3">
      <p><b>{title}</b> {children}</p>
      {below && <div className="mt-3">{below}</div>}
      {actions && <div className="mt-3 flex flex-wrap gap-3">{actions}</div>}
    </div>
  );
}
