'use client';

import { useFieldArray } from 'react-hook-form';
import { FaultText } from '../forms/fault-text';
import { Button } from '../ui/button';
import type { CaseForm } from './case-form-type';
import { newField } from './case-values';
import { NormRows } from './norm-rows';

interface FieldRowsProps { form: CaseForm; isExactness: boolean; known: readonly string[] }

/** The fields of a case; those of the problem's exact solution are offered by name. */
export function FieldRows({ form, isExactness, known }: FieldRowsProps) {
  const { fields, append, remove } = useFieldArray({ control: form.control, name: 'fields' });
  const named = form.watch('fields').map(({ field }) => field);
  const missing = known.filter((name) => !named.includes(name));
  const fault = form.formState.errors.fields?.root?.message;
  return (
    <div className="flex flex-col gap-8">
      {fields.map((field, place) => <NormRows key={field.id} form={form} place={place} isExactness={isExactness} onRemove={() => remove(place)} />)}
      {fault && <FaultText text={fault} />}
      <p className="flex flex-wrap gap-3">
        {missing.map((name) => <Button key={name} onClick={() => append(newField(name))}>Add field {name}</Button>)}
        {known.length === 0 ? <Button onClick={() => append(newField(''))}>Add a field</Button> : <Button onClick={() => append(newField(''))}>Add a compared field</Button>}
        {known.length > 0 && missing.length === 0 && <span className="text-note text-graphite">Every field of the exact solution is declared.</span>}
      </p>
    </div>
  );
}
