'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import type { ReactNode } from 'react';
import { useForm } from 'react-hook-form';
import { signInContract, signInSchema, type Me } from '@/lib/domain/people/schema';
import { callApi } from '../api/call-api';
import '../api/configure-zod';
import { useSubmit } from '../api/use-submit';
import { FormActions } from '../forms/form-actions';
import { ProblemNotice } from '../forms/problem-notice';
import { TextField } from '../forms/text-field';
import { Button } from '../ui/button';
import { arrivalAddress } from './arrive';
import { goAfresh } from './go-afresh';

interface SignInFormProps {
  next: string | null;
  email?: string;
  /** What follows, where it is not going on to a page. */
  onSignedIn?: (me: Me) => void;
  others?: ReactNode;
}

export function SignInForm({ next, email = '', onSignedIn = (me) => goAfresh(arrivalAddress(me, next)), others }: SignInFormProps) {
  const form = useForm({ resolver: zodResolver(signInSchema), defaultValues: { email, password: '' } });
  const { errors, isSubmitting } = form.formState;
  const { onSubmit, problem } = useSubmit({
    form,
    send: (typed) => callApi(signInContract, { body: typed }),
    onDone: onSignedIn,
  });
  return (
    <form onSubmit={onSubmit} noValidate className="max-w-80">
      <div className="grid gap-5">
        <TextField label="E-mail" type="email" autoComplete="username" error={errors.email?.message} {...form.register('email')} />
        <TextField label="Password" type="password" autoComplete="current-password" error={errors.password?.message} {...form.register('password')} />
      </div>
      <ProblemNotice problem={problem} />
      <FormActions answer={isSubmitting ? 'Signing in.' : null}><Button kind="primary" type="submit">Sign in</Button>{others}</FormActions>
    </form>
  );
}
