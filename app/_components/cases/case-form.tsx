'use client';

import type { ReactNode } from 'react';
import type { Code } from '@/lib/domain/codes/schema';
import type { Problem } from '@/lib/domain/problems/schema';
import type { Submit } from '../api/use-submit';
import { FormActions } from '../forms/form-actions';
import { ProblemNotice } from '../forms/problem-notice';
import { Button } from '../ui/button';
import { Section } from '../ui/section';
import { CaseFields } from './case-fields';
import type { CaseForm as CaseFormState } from './case-form-type';

interface CaseFormProps {
  form: CaseFormState; submit: Submit; codes: readonly Code[]; problems: readonly Problem[]; isNew: boolean; action: string;
  others?: ReactNode;
  /** Stands in place of the refusal where somebody else saved meanwhile. */
  conflict?: ReactNode;
}

export function CaseForm({ form, submit, codes, problems, isNew, action, others, conflict }: CaseFormProps) {
  const { isSubmitting, isSubmitted, isValid } = form.formState;
  const answer = isSubmitting ? 'Saving.' : isSubmitted && !isValid ? 'Not saved. The faults stand at their fields.' : null;
  return (
    <form onSubmit={submit.onSubmit} noValidate className="mt-12">
      <CaseFields form={form} codes={codes} problems={problems} isNew={isNew} />
      <Section>
        {conflict ?? <ProblemNotice problem={submit.problem} />}
        <FormActions answer={answer}><Button kind="primary" type="submit">{action}</Button>{others}</FormActions>
      </Section>
    </form>
  );
}
