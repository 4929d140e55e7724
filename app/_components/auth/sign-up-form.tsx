'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { signUpContract, signUpSchema } from '@/lib/domain/people/schema';
import { callApi } from '../api/call-api';
import '../api/configure-zod';
import { useSubmit } from '../api/use-submit';
import { FormActions } from '../forms/form-actions';
import { ProblemNotice } from '../forms/problem-notice';
import { TextField } from '../forms/text-field';
import { Button } from '../ui/button';
import { arrivalAddress } from './arrive';
import { goAfresh } from './go-afresh';

export function SignUpForm() {
  const form = useForm({ resolver: zodResolver(signUpSchema), mode: 'onTouched', defaultValues: { email: '', password: '', organisation: '' } });
  const { errors, isSubmitting } = form.formState;
  const { onSubmit, problem } = useSubmit({
    form,
    send: (typed) => callApi(signUpContract, { body: typed }),
    onDone: (me) => goAfresh(arrivalAddress(me, null)),
  });
  return (
    <form onSubmit={onSubmit} noValidate className="max-w-80">
      <div className="grid gap-5">
        <TextField label="Organisation" autoComplete="organization" hint="The group that owns the solver." error={errors.organisation?.message} {...form.register('organisation')} />
        <TextField label="E-mail" type="email" autoComplete="username" error={errors.email?.message} {...form.register('email')} />
        <TextField label="Password" type="password" autoComplete="new-password" hint="At least 10 characters." error={errors.password?.message} {...form.register('password')} />
      </div>
      <ProblemNotice problem={problem} />
      <FormActions answer={isSubmitting ? 'Making the account.' : null}><Button kind="primary" type="submit">Make the account</Button></FormActions>
    </form>
  );
}
