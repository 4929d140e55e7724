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
  /** Other ways on than sending. */
  others?: ReactNode;
  /** Stands in place of the refusal where somebody else saved meanwhile. */
  conflict?: ReactNode;
}

export function ProblemForm({ form, submit, isNew, action, others, conflict }: ProblemFormProps) {
  return (
    <form onSubmit={submit.onSubmit} noValidate className="mt-12">
      <ProblemFields form={form} isNew={isNew} />
      <Section>
        {conflict ?? <ProblemNotice problem={submit.problem} />}
        <FormActions answer={form.formState.isSubmitting ? 'Saving.' : null}>
          <Button kind="primary" type="submit">{action}</Button>
          {others}
        </FormActions>
      </Section>
    </form>
  );
}
