'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { changePasswordContract, changePasswordSchema } from '@/lib/domain/people/account-schema';
import { callApi } from '../api/call-api';
import { useSubmit } from '../api/use-submit';
import { FormActions } from '../forms/form-actions';
import { ProblemNotice } from '../forms/problem-notice';
import { TextField } from '../forms/text-field';
import { Button } from '../ui/button';

const empty = { password: '', newPassword: '' };

export function ChangePasswordForm({ email }: { email: string }) {
  const [isChanged, setIsChanged] = useState(false);
  const form = useForm({ resolver: zodResolver(changePasswordSchema), defaultValues: empty });
  const { errors, isSubmitting } = form.formState;
  const { onSubmit, problem } = useSubmit({
    form,
    send: (typed) => callApi(changePasswordContract, { body: typed }),
    onDone: () => {
      setIsChanged(true);
      form.reset(empty);
    },
  });
  const answer = isChanged ? 'Changed. Your other sessions have ended.' : null;
  return (
    <form onSubmit={onSubmit} noValidate className="max-w-80">
      <input type="email" autoComplete="username" value={email} readOnly hidden />
      <div className="grid gap-5">
        <TextField label="Present password" type="password" autoComplete="current-password" error={errors.password?.message} {...form.register('password')} />
        <TextField label="New password" type="password" autoComplete="new-password" hint="At least 10 characters." error={errors.newPassword?.message} {...form.register('newPassword')} />
      </div>
      <ProblemNotice problem={problem} />
      <FormActions answer={isSubmitting ? 'Changing.' : answer}><Button type="submit">Change password</Button></FormActions>
    </form>
  );
}
