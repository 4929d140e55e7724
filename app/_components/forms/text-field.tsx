import type { ComponentProps } from 'react';
import { Field, type FieldLabels } from './field';
import { controlLook, lineHeight } from './control-look';

export type TextFieldProps = FieldLabels & ComponentProps<'input'>;

export function TextField({ label, hint, error, id, className, ...input }: TextFieldProps) {
  return (
    <Field label={label} hint={hint} error={error} id={id} className={className}>
      {(links) => <input type="text" {...input} {...links} className={`${controlLook} ${lineHeight}`} />}
    </Field>
  );
}
