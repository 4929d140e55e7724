'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { signInContract, signInSchema } from '@/lib/domain/people/schema';
import { callApi } from '../api/call-api';
import '../api/configure-zod';
import { useSubmit } from '../api/use-submit';
import { FormActions } from '../forms/form-actions';
import { ProblemNotice } from '../forms/problem-notice';
import { TextField } from '../forms/text-field';
import { Button } from '../ui/button';
import { arrivalAddress } from './arrive';
import { goAfresh } from './go-afresh';

export function SignInForm({ next }: { next: string | null }) {
  const form = useForm({ resolver: zodResolver(signInSchema), defaultValues: { email: '', password: '' } });
  const { errors, isSubmitting } = form.formState;
  const { onSubmit, problem } = useSubmit({
    form,
    send: (typed) => callApi(signInContract, { body: typed }),
    onDone: (me) => goAfresh(arrivalAddress(me, next)),
  });
  return (
    <form onSubmit={onSubmit} noValidate className="max-w-80">
      <div className="grid gap-5">
        <TextField label="E-mail" type="email" autoComplete="username" error={errors.email?.message} {...form.register('email')} />
        <TextField label="Password" type="password" autoComplete="current-password" error={errors.password?.message} {...form.register('password')} />
      </div>
      <ProblemNotice problem={problem} />
      <FormActions answer={isSubmitting ? 'Signing in.' : null}><Button kind="primary" type="submit">Sign in</Button></FormActions>
    </form>
  );
}
