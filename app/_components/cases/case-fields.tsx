'use client';

import { caseKindSchema } from '@/lib/domain/cases/definition';
import type { Code } from '@/lib/domain/codes/schema';
import type { Problem } from '@/lib/domain/problems/schema';
import { builtInRule } from '@/lib/domain/rules/built-in-rule';
import { NumberField } from '../forms/number-field';
import { SelectField } from '../forms/select-field';
import { TextArea } from '../forms/text-area';
import { TextField } from '../forms/text-field';
import { Section } from '../ui/section';
import { NormSymbol } from '../ui/symbols';
import type { CaseForm } from './case-form-type';
import { FieldRows } from './field-rows';
import { GridPlanRows } from './grid-plan-rows';
import { kindWords } from './kind-words';
import { OptionRows } from './option-rows';
import { QuantityRows } from './quantity-rows';

const degrees = Array.from({ length: 12 }, (_, i) => i + 1);

interface CaseFieldsProps { form: CaseForm; codes: readonly Code[]; problems: readonly Problem[]; isNew: boolean }

/** Everything of a case that is typed. */
export function CaseFields({ form, codes, problems, isNew }: CaseFieldsProps) {
  const { register, formState: { errors } } = form;
  const [kind, problemKey] = form.watch(['kind', 'problem']);
  const problem = problems.find(({ slug }) => slug === problemKey);
  return (
    <>
      <Section heading="Case" note={<p><b>{kind.charAt(0).toUpperCase()}{kind.slice(1)}.</b> {kindWords[kind]}</p>}>
        <div className="grid max-w-[600px] gap-5 tablet:grid-cols-2">
          <TextField label="Name" autoComplete="off" className="tablet:col-span-2" error={errors.name?.message} {...register('name')} />
          {isNew && (
            <>
              <SelectField label="Code" error={errors.code?.message} {...register('code')}>
                <option value="">Choose a code</option>
                {codes.map(({ slug, name }) => <option key={slug} value={slug}>{name}</option>)}
              </SelectField>
              <SelectField label="Kind" error={errors.kind?.message} {...register('kind')}>
                {caseKindSchema.options.map((each) => <option key={each}>{each}</option>)}
              </SelectField>
            </>
          )}
          <SelectField label="Problem" error={errors.problem?.message} {...register('problem', { deps: ['fields'] })}>
            <option value="">Choose a problem</option>
            {problems.map(({ slug, name }) => <option key={slug} value={slug}>{name}</option>)}
          </SelectField>
          {isNew && <TextField label="Short name, if not made from the name" autoComplete="off" spellCheck={false} hint="Stands in addresses." error={errors.slug?.message} {...register('slug')} />}
        </div>
      </Section>
      <Section heading="Options" note={<p>What the code is told to use here, such as flux: central.</p>}><OptionRows form={form} /></Section>
      {kind !== 'solution' && (
        <Section
          heading="Fields and norms"
          note={<><p>A norm that <b>counts</b> decides the outcome. <NormSymbol norm="L1" /> may not count alone.</p><p>Left empty, the tolerance is the rule’s: the larger of 0.1 and 5 % of the order, for <NormSymbol norm="Linf" /> 0.2 and 10 %. A case may only tighten it.</p></>}
        >
          <FieldRows form={form} isExactness={kind === 'exactness'} known={Object.keys(problem?.exact ?? {})} />
        </Section>
      )}
      {kind !== 'exactness' && <Section heading="Quantities"><QuantityRows form={form} kind={kind} /></Section>}
      <Section heading="Grid plan" note={<p>Frozen when the first data of a study arrives. Four grids or more; with three the rule errs too often.</p>}>
        <GridPlanRows form={form} dimension={problem?.dimension ?? 1} isUnsteady={problem?.unsteady ?? false} />
      </Section>
      <Section heading="Acceptance">
        <div className="grid max-w-[600px] gap-5 tablet:grid-cols-2">
          <NumberField label="Grids needed for an outcome" hint={`Left empty: ${builtInRule.minimumGrids}, as the rule says.`} error={errors.minimumGrids?.message} {...register('minimumGrids')} />
          <SelectField label="Values in the output are" hint="Must be stated for a formal order of 3 or more." {...register('sampling')}>
            <option value="">not stated</option><option value="point">values at points</option><option value="average">cell averages</option><option value="quadrature">values at quadrature points</option>
          </SelectField>
          <SelectField label="Source terms in the code are" {...register('sourceSampling')}>
            <option value="">not stated</option><option value="point">values at points</option><option value="average">cell averages</option><option value="quadrature">values at quadrature points</option>
          </SelectField>
          <SelectField label="Finite elements of degree" hint="Gives the orders that are not stated." {...register('elementDegree')}>
            <option value="">no finite elements</option>{degrees.map((degree) => <option key={degree}>{degree}</option>)}
          </SelectField>
          <TextArea label="Requirement ids, one a line" rows={3} className="tablet:col-span-2" error={errors.requirements?.message} {...register('requirements')} />
        </div>
      </Section>
    </>
  );
}
