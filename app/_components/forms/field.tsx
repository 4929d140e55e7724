import { useId, type ReactNode } from 'react';
import { FaultText } from './fault-text';

export interface FieldLabels {
  label: ReactNode;
  hint?: ReactNode;
  error?: string;
}

interface ControlLinks { id: string; 'aria-invalid'?: true; 'aria-describedby'?: string }

interface FieldProps extends FieldLabels {
  id?: string;
  className?: string;
  children: (links: ControlLinks) => ReactNode;
}

/** Label above, hint and fault below, tied to the control for screen readers. */
export function Field({ label, hint, error, id, className = '', children }: FieldProps) {
  const ownId = useId();
  const controlId = id ?? ownId;
  const described = [error && `${controlId}-error`, hint && `${controlId}-hint`].filter(Boolean).join(' ');
  return (
    <div className={className}>
      <label htmlFor={controlId} className="mb-1 block text-note text-graphite">{label}</label>
      {children({ id: controlId, 'aria-invalid': error ? true : undefined, 'aria-describedby': described || undefined })}
      {error && <FaultText id={`${controlId}-error`} text={error} />}
      {hint && <p id={`${controlId}-hint`} className="mt-1 text-note text-graphite">{hint}</p>}
    </div>
  );
}
