'use client';

import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { confirmResetContract, confirmResetSchema } from '@/lib/domain/people/account-schema';
import { callApi } from '../api/call-api';
import { useSubmit } from '../api/use-submit';
import { checkedResolver, issuesOf } from '../forms/checked-resolver';
import { FormActions } from '../forms/form-actions';
import { ProblemNotice } from '../forms/problem-notice';
import { TextField } from '../forms/text-field';
import { Button } from '../ui/button';
import { TextLink } from '../ui/text-link';
import { useLinkToken } from './use-link-token';

export function SetPasswordForm({ token: given }: { token: string }) {
  const token = useLinkToken(given) ?? '';
  const [isSet, setIsSet] = useState(false);
  const check = ({ password }: { password: string }) => {
    const parsed = confirmResetSchema.safeParse({ token, password });
    return parsed.success ? { ok: true as const, typed: parsed.data } : { ok: false as const, faults: issuesOf(parsed.error) };
  };
  const form = useForm({ resolver: checkedResolver(check, (path) => path), mode: 'onTouched', defaultValues: { password: '' } });
  const { onSubmit, problem } = useSubmit({ form, send: (typed) => callApi(confirmResetContract, { body: typed }), onDone: () => setIsSet(true) });
  if (isSet) return <p role="status">The password is set, and every session has ended. <TextLink href="/sign-in">Sign in</TextLink></p>;
  return (
    <form onSubmit={onSubmit} noValidate className="max-w-80">
      <TextField label="New password" type="password" autoComplete="new-password" hint="At least 10 characters." error={form.formState.errors.password?.message} {...form.register('password')} />
      <ProblemNotice problem={problem} actions={<TextLink href="/reset-password">Ask for another link</TextLink>} />
      <FormActions answer={form.formState.isSubmitting ? 'Setting the password.' : null}><Button kind="primary" type="submit">Set the password</Button></FormActions>
    </form>
  );
}
