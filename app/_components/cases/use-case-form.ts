'use client';

import { useForm } from 'react-hook-form';
import type { CreateCaseInput } from '@/lib/domain/cases/schema';
import type { Problem } from '@/lib/domain/problems/schema';
import { checkedResolver } from '../forms/checked-resolver';
import { checkCaseValues } from './case-definition';
import { caseField } from './case-field';
import type { CaseForm } from './case-form-type';
import type { CaseValues } from './case-values';

/** The form of a case, checked as typed against the problem that is chosen in it. */
export function useCaseForm(defaultValues: CaseValues, problems: readonly Problem[]): CaseForm {
  return useForm<CaseValues, unknown, CreateCaseInput>({
    resolver: checkedResolver((values) => checkCaseValues(values, problems.find(({ slug }) => slug === values.problem)), caseField),
    mode: 'onTouched', defaultValues,
  });
}
