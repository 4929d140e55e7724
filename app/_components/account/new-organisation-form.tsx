'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { createOrganisationContract, createOrganisationSchema } from '@/lib/domain/people/schema';
import { callApi } from '../api/call-api';
import { useSubmit } from '../api/use-submit';
import { goAfresh } from '../auth/go-afresh';
import { FormActions } from '../forms/form-actions';
import { ProblemNotice } from '../forms/problem-notice';
import { TextField } from '../forms/text-field';
import { Button } from '../ui/button';

export function NewOrganisationForm() {
  const form = useForm({ resolver: zodResolver(createOrganisationSchema), defaultValues: { name: '' } });
  const { onSubmit, problem } = useSubmit({
    form,
    send: (typed) => callApi(createOrganisationContract, { body: typed }),
    onDone: ({ slug }) => goAfresh(`/${slug}`),
  });
  return (
    <form onSubmit={onSubmit} noValidate className="max-w-80">
      <TextField label="Name" autoComplete="off" hint="You become its owner and engineer." error={form.formState.errors.name?.message} {...form.register('name')} />
      <ProblemNotice problem={problem} />
      <FormActions answer={form.formState.isSubmitting ? 'Making the organisation.' : null}><Button type="submit">Make the organisation</Button></FormActions>
    </form>
  );
}
