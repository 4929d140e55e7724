'use client';

import { useFieldArray, type UseFormReturn } from 'react-hook-form';
import { FaultText } from '../forms/fault-text';
import { TextField } from '../forms/text-field';
import { Button } from '../ui/button';
import { TextButton } from '../ui/text-link';
import { ExactFormula } from './exact-formula';
import type { ProblemValues } from './problem-values';

interface NamedRowsProps<Typed> {
  form: UseFormReturn<ProblemValues, unknown, Typed>;
  list: 'exact' | 'constants';
  /** What one row holds, such as "Field". */
  what: string;
  textLabel: string;
  of?: readonly string[];
}

/** Rows of a name and an expression, each set below as it is read. */
export function NamedRows<Typed>({ form, list, what, textLabel, of }: NamedRowsProps<Typed>) {
  const { fields, append, remove } = useFieldArray({ control: form.control, name: list });
  const rows = form.watch(list);
  const faults = form.formState.errors[list];
  const checkAll = { deps: ['exact' as const, 'constants' as const] };
  return (
    <div className="flex flex-col gap-5">
      {fields.map((field, index) => (
        <div key={field.id}>
          <div className="grid grid-cols-1 items-start gap-x-3 gap-y-2 tablet:grid-cols-[120px_minmax(0,1fr)_auto]">
            <TextField label={what} autoComplete="off" spellCheck={false} className="[&_input]:font-mono" error={faults?.[index]?.name?.message} {...form.register(`${list}.${index}.name`, checkAll)} />
            <TextField label={textLabel} autoComplete="off" spellCheck={false} className="[&_input]:font-mono" error={faults?.[index]?.text?.message} {...form.register(`${list}.${index}.text`, checkAll)} />
            <TextButton className="min-h-11 text-left tablet:mt-7 tablet:min-h-9" aria-label={`Remove ${what.toLowerCase()} ${rows[index]?.name || index + 1}`} onClick={() => remove(index)}>Remove</TextButton>
          </div>
          <ExactFormula name={rows[index]?.name ?? ''} text={rows[index]?.text ?? ''} of={of} />
        </div>
      ))}
      {faults?.root?.message && <FaultText text={faults.root.message} />}
      <p><Button onClick={() => append({ name: '', text: '' })}>Add a {what.toLowerCase()}</Button></p>
    </div>
  );
}
