'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { requestResetContract, requestResetSchema } from '@/lib/domain/people/account-schema';
import { callApi } from '../api/call-api';
import '../api/configure-zod';
import { useSubmit } from '../api/use-submit';
import { FormActions } from '../forms/form-actions';
import { ProblemNotice } from '../forms/problem-notice';
import { TextField } from '../forms/text-field';
import { Button } from '../ui/button';

export function AskResetForm() {
  const [asked, setAsked] = useState('');
  const form = useForm({ resolver: zodResolver(requestResetSchema), defaultValues: { email: '' } });
  const { onSubmit, problem } = useSubmit({ form, send: (typed) => callApi(requestResetContract, { body: typed }), onDone: ({ email }) => setAsked(email) });
  return (
    <form onSubmit={onSubmit} noValidate className="max-w-80">
      <TextField label="E-mail" type="email" autoComplete="username" error={form.formState.errors.email?.message} {...form.register('email')} />
      <ProblemNotice problem={problem} />
      <FormActions answer={form.formState.isSubmitting ? 'Asking.' : null}><Button kind="primary" type="submit">Send the link</Button></FormActions>
      {asked !== '' && <p role="status" className="mt-4 border-y border-rule py-3">If {asked} has an account, a mail with a link is on its way. The link holds for one hour. Nothing there? Look among unwanted mail, and at how the address is written.</p>}
    </form>
  );
}
