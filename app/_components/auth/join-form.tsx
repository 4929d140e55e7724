'use client';

import { useForm } from 'react-hook-form';
import { acceptInvitationContract, type OpenInvitation } from '@/lib/domain/invitations/schema';
import { callApi } from '../api/call-api';
import { useSubmit } from '../api/use-submit';
import { FormActions } from '../forms/form-actions';
import { ProblemNotice } from '../forms/problem-notice';
import { TextField } from '../forms/text-field';
import { Button } from '../ui/button';
import { TextLink } from '../ui/text-link';
import { goAfresh } from './go-afresh';

interface JoinFormProps { token: string; invitation: OpenInvitation; isSignedIn: boolean }

function buttonText({ organisation, hasAccount }: OpenInvitation, isSignedIn: boolean): string {
  if (isSignedIn) return `Join ${organisation}`;
  return hasAccount ? 'Sign in and join' : 'Make the account and join';
}

/** Joins as the person signed in, with the password of the account there is, or with one chosen for a new account. */
export function JoinForm({ token, invitation, isSignedIn }: JoinFormProps) {
  const { email, hasAccount } = invitation;
  const form = useForm({ defaultValues: { password: '' } });
  const { onSubmit, problem } = useSubmit({
    form,
    send: ({ password }) => callApi(acceptInvitationContract, { body: { token, ...(isSignedIn ? {} : { password }) } }),
    // The organisation joined last stands last.
    onDone: (me) => goAfresh(`/${me.organisations.at(-1)?.slug ?? 'account'}`),
  });
  return (
    <form onSubmit={onSubmit} noValidate className="mt-6 max-w-80">
      {!isSignedIn && (
        <div className="grid gap-5">
          <TextField label="E-mail" type="email" autoComplete="username" readOnly value={email} />
          <TextField
            label="Password" type="password" autoComplete={hasAccount ? 'current-password' : 'new-password'}
            hint={hasAccount ? <>Of the account you have. <TextLink href="/reset-password">Forgotten?</TextLink></> : 'At least 10 characters.'}
            error={form.formState.errors.password?.message} {...form.register('password')}
          />
        </div>
      )}
      <ProblemNotice problem={problem} />
      <FormActions answer={form.formState.isSubmitting ? 'Joining.' : null}><Button kind="primary" type="submit">{buttonText(invitation, isSignedIn)}</Button></FormActions>
    </form>
  );
}
