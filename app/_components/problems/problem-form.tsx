'use client';

import type { ReactNode } from 'react';
import type { UseFormReturn } from 'react-hook-form';
import type { CreateProblemInput } from '@/lib/domain/problems/schema';
import type { Submit } from '../api/use-submit';
import { FormActions } from '../forms/form-actions';
import { ProblemNotice } from '../forms/problem-notice';
import { Button } from '../ui/button';
import { Section } from '../ui/section';
import { ProblemFields } from './problem-fields';
import type { ProblemValues } from './problem-values';

interface ProblemFormProps {
  form: UseFormReturn<ProblemValues, unknown, CreateProblemInput>;
  submit: Submit;
  isNew: boolean;
  action: string;
  /** Other ways on than sending, and what a refusal offers. */
  others?: ReactNode;
  wayOn?: ReactNode;
}

export function ProblemForm({ form, submit, isNew, action, others, wayOn }: ProblemFormProps) {
  return (
    <form onSubmit={submit.onSubmit} noValidate className="mt-12">
      <ProblemFields form={form} isNew={isNew} />
      <Section>
        <ProblemNotice problem={submit.problem} actions={wayOn} />
        <FormActions answer={form.formState.isSubmitting ? 'Saving.' : null}>
          <Button kind="primary" type="submit">{action}</Button>
          {others}
        </FormActions>
      </Section>
    </form>
  );
}
