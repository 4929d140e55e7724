import type { ReactNode } from 'react';
import { Button } from '../ui/button';

interface AskedOnceProps {
  question: string;
  /** What will happen. */
  children: ReactNode;
  action: string;
  keep: string;
  isPending: boolean;
  onDo: () => void;
  onKeep: () => void;
}

/** Asks once before something that cannot be taken back. */
export function AskedOnce({ question, children, action, keep, isPending, onDo, onKeep }: AskedOnceProps) {
  return (
    <div role="alertdialog" aria-label={question} className="mt-4 border-b border-t-3 border-b-rule border-t-fail py-3">
      <p><b>{question}</b> {children}</p>
      <div className="mt-3 flex flex-wrap gap-3">
        <Button kind="binding" autoFocus disabled={isPending} onClick={onDo}>{action}</Button>
        <Button onClick={onKeep}>{keep}</Button>
      </div>
    </div>
  );
}
