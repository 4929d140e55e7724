import type { ComponentProps } from 'react';
import { Field, type FieldLabels } from './field';
import { controlLook, lineHeight } from './control-look';

export function SelectField({ label, hint, error, id, className, children, ...select }: FieldLabels & ComponentProps<'select'>) {
  return (
    <Field label={label} hint={hint} error={error} id={id} className={className}>
      {(links) => (
        <span className="relative block">
          <select {...select} {...links} className={`${controlLook} ${lineHeight} cursor-pointer appearance-none truncate pr-8`}>
            {children}
          </select>
          <svg viewBox="0 0 10 6" width="10" height="6" aria-hidden className="pointer-events-none absolute top-1/2 right-3 -mt-[3px] stroke-rule" fill="none">
            <path d="M1 1l4 4 4-4" />
          </svg>
        </span>
      )}
    </Field>
  );
}
