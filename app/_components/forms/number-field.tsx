import { TextField, type TextFieldProps } from './text-field';

/** A number as typed text: the browser's own number box swallows what it cannot read, and a fault must quote it. */
export function NumberField(field: Omit<TextFieldProps, 'type' | 'inputMode'>) {
  return <TextField autoComplete="off" spellCheck={false} {...field} type="text" inputMode="decimal" />;
}
