import { useId, type ComponentProps } from 'react';
import { FaultText } from './fault-text';
import type { FieldLabels } from './field';

/** A box to tick, or with `type="radio"` one of several. */
export function CheckField({ label, hint, error, id, className = '', type = 'checkbox', ...input }: FieldLabels & ComponentProps<'input'>) {
  const ownId = useId();
  const controlId = id ?? ownId;
  const described = [error && `${controlId}-error`, hint && `${controlId}-hint`].filter(Boolean).join(' ');
  return (
    <div className={className}>
      <label htmlFor={controlId} className="flex min-h-11 cursor-pointer items-center gap-2 tablet:min-h-6">
        <input
          {...input}
          id={controlId}
          type={type}
          aria-invalid={error ? true : undefined}
          aria-describedby={described || undefined}
          className="size-4 shrink-0 cursor-pointer accent-ink"
        />
        <span>{label}</span>
      </label>
      {error && <FaultText id={`${controlId}-error`} text={error} />}
      {hint && <p id={`${controlId}-hint`} className="ml-6 text-note text-graphite">{hint}</p>}
    </div>
  );
}
