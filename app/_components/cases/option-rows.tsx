'use client';

import { useFieldArray } from 'react-hook-form';
import { FaultText } from '../forms/fault-text';
import { TextField } from '../forms/text-field';
import { Button } from '../ui/button';
import { TextButton } from '../ui/text-link';
import type { CaseForm } from './case-form-type';

export function OptionRows({ form }: { form: CaseForm }) {
  const { fields, append, remove } = useFieldArray({ control: form.control, name: 'options' });
  const fault = form.formState.errors.options?.root?.message;
  return (
    <div className="flex flex-col gap-4">
      {fields.map((field, place) => (
        <div key={field.id} className="grid items-start gap-x-5 gap-y-2 tablet:grid-cols-[200px_minmax(0,280px)_auto]">
          <TextField label="Option" autoComplete="off" {...form.register(`options.${place}.name`)} />
          <TextField label="Choice" autoComplete="off" {...form.register(`options.${place}.text`)} />
          <TextButton className="min-h-11 text-left tablet:mt-7 tablet:min-h-9" aria-label={`Remove option ${place + 1}`} onClick={() => remove(place)}>Remove</TextButton>
        </div>
      ))}
      {fault && <FaultText text={fault} />}
      <p><Button onClick={() => append({ name: '', text: '' })}>Add an option</Button></p>
    </div>
  );
}
