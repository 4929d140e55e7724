'use client';

import type { UseFormReturn } from 'react-hook-form';
import { variablesOf } from '@/lib/domain/problems/variables';
import { CheckField } from '../forms/check-field';
import { NumberField } from '../forms/number-field';
import { SelectField } from '../forms/select-field';
import { TextField } from '../forms/text-field';
import { Section } from '../ui/section';
import { Sym } from '../ui/symbols';
import { choosableEquations, equationNames } from './equation-names';
import { NamedRows } from './named-rows';
import type { ProblemValues } from './problem-values';

interface ProblemFieldsProps<Typed> { form: UseFormReturn<ProblemValues, unknown, Typed>; isNew: boolean }

/** Everything of a problem that is typed. */
export function ProblemFields<Typed>({ form, isNew }: ProblemFieldsProps<Typed>) {
  const { register, formState: { errors } } = form;
  const [dimension, unsteady] = form.watch(['dimension', 'unsteady']);
  const variables = variablesOf({ dimension: Number(dimension) as 1 | 2 | 3, unsteady });
  const checkExpressions = { deps: ['exact' as const, 'constants' as const] };
  return (
    <>
      <Section heading="Problem">
        <div className="grid max-w-[600px] gap-5 tablet:grid-cols-2">
        <TextField label="Name" autoComplete="off" error={errors.name?.message} {...register('name')} />
        {isNew && <TextField label="Short name, if not made from the name" autoComplete="off" spellCheck={false} hint="Stands in addresses." error={errors.slug?.message} {...register('slug')} />}
        <SelectField label="Equation" error={errors.equation?.message} {...register('equation')}>
          {choosableEquations.map((equation) => <option key={equation} value={equation}>{equationNames[equation]}</option>)}
        </SelectField>
        <TextField label="Form, if it matters" autoComplete="off" hint="Such as divergence form." error={errors.form?.message} {...register('form')} />
        <SelectField label="Dimensions in space" {...register('dimension', checkExpressions)}><option>1</option><option>2</option><option>3</option></SelectField>
        <CheckField label={<>Unsteady: depends on <Sym>t</Sym></>} className="tablet:mt-8" {...register('unsteady', checkExpressions)} />
        </div>
      </Section>
      <Section heading="Exact solution" note={<><p>Plain algebra: + − * / ^ and parentheses, sin cos tan sinh cosh tanh asin acos atan exp log sqrt erf, pi. Multiplication is written out: 2*x.</p><p>Coordinates: {variables.join(', ')}.</p></>}>
        <NamedRows form={form} list="exact" what="Field" textLabel="Exact solution" of={variables} />
      </Section>
      <Section heading="Constants" note={<p>A number, or an expression of other constants and of the coordinates.</p>}>
        <NamedRows form={form} list="constants" what="Constant" textLabel="Value" />
      </Section>
      <Section heading="Domain" note={<p>The box the problem is solved in, if it is one.</p>}>
        <div className="flex max-w-[600px] flex-col gap-5">
          {(['x', 'y', 'z'] as const).slice(0, Number(dimension)).map((axis, index) => (
            <div key={axis} className="grid gap-5 tablet:grid-cols-2">
              <NumberField label={<><Sym>{axis}</Sym> from</>} error={errors.domain?.[index]?.from?.message} {...register(`domain.${index}.from`)} />
              <NumberField label={<><Sym>{axis}</Sym> to</>} error={errors.domain?.[index]?.to?.message} {...register(`domain.${index}.to`)} />
            </div>
          ))}
        </div>
      </Section>
    </>
  );
}
