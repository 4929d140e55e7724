import type { ComponentProps } from 'react';
import { Field, type FieldLabels } from './field';
import { controlLook } from './control-look';

interface TextAreaProps extends FieldLabels, ComponentProps<'textarea'> {
  /** Formulas, tables and other text where each sign counts. */
  code?: boolean;
}

export function TextArea({ label, hint, error, id, className, code, rows = 4, ...area }: TextAreaProps) {
  return (
    <Field label={label} hint={hint} error={error} id={id} className={className}>
      {(links) => (
        <textarea {...area} {...links} rows={rows} className={`${controlLook} py-1.5 ${code ? 'font-mono text-code' : ''}`} />
      )}
    </Field>
  );
}
