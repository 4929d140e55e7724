'use client';

import { useFieldArray } from 'react-hook-form';
import type { CaseKind } from '@/lib/domain/cases/definition';
import { procedureNames } from '@/lib/domain/assessment/explain-procedure';
import { procedures } from '@/lib/numerics/assessment';
import { FaultText } from '../forms/fault-text';
import { NumberField } from '../forms/number-field';
import { SelectField } from '../forms/select-field';
import { TextField } from '../forms/text-field';
import { Button } from '../ui/button';
import { TextButton } from '../ui/text-link';
import type { CaseForm } from './case-form-type';
import { newQuantity } from './case-values';

/** Quantities judged by their values, or against a known one. */
export function QuantityRows({ form, kind }: { form: CaseForm; kind: CaseKind }) {
  const { fields, append, remove } = useFieldArray({ control: form.control, name: 'quantities' });
  const { register, formState: { errors } } = form;
  const fault = errors.quantities?.root?.message;
  return (
    <div className="flex flex-col gap-6">
      {fields.map((field, place) => {
        const faults = errors.quantities?.[place];
        return (
          <fieldset key={field.id} className="grid items-start gap-x-5 gap-y-3 tablet:grid-cols-4">
            <legend className="sr-only">Quantity {place + 1}</legend>
            <TextField label="Quantity" autoComplete="off" className="tablet:col-span-2" error={faults?.name?.message} {...register(`quantities.${place}.name`)} />
            <TextField label="Unit" autoComplete="off" error={faults?.unit?.message} {...register(`quantities.${place}.unit`)} />
            <TextButton className="min-h-11 text-left tablet:mt-7 tablet:min-h-9" onClick={() => remove(place)}>Remove quantity</TextButton>
            <NumberField label="Formal order" error={faults?.formalOrder?.message} {...register(`quantities.${place}.formalOrder`)} />
            {kind !== 'solution' && <NumberField label="Known value" error={faults?.knownValue?.message} {...register(`quantities.${place}.knownValue`)} />}
            {kind !== 'benchmark' && <NumberField label="Largest GCI or U accepted" hint="A fraction: 0.02 is 2 %." error={faults?.target?.message} {...register(`quantities.${place}.target`)} />}
            {kind !== 'benchmark' && (
              <SelectField label="Procedure" error={faults?.procedure?.message} {...register(`quantities.${place}.procedure`)}>
                {procedures.map((each) => <option key={each} value={each}>{procedureNames[each].toLowerCase()}</option>)}
              </SelectField>
            )}
            {kind !== 'benchmark' && <NumberField label="Factor k of u_num" hint="1.1 to 1.15, or 2; left empty: none." error={faults?.uNumFactor?.message} {...register(`quantities.${place}.uNumFactor`)} />}
          </fieldset>
        );
      })}
      {fault && <FaultText text={fault} />}
      <p><Button onClick={() => append(newQuantity)}>Add a quantity</Button></p>
    </div>
  );
}
