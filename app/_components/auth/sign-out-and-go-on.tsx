'use client';

import { useState } from 'react';
import { signOutContract } from '@/lib/domain/people/schema';
import { callApi } from '../api/call-api';
import { FormActions } from '../forms/form-actions';
import { Button } from '../ui/button';
import { goAfresh } from './go-afresh';

/** The link is for somebody else than is signed in: nothing is done in the wrong name. */
export function SignOutAndGoOn({ signedInAs, neededEmail, address }: { signedInAs: string; neededEmail: string; address: string }) {
  const [answer, setAnswer] = useState('');
  const signOut = async () => {
    try {
      await callApi(signOutContract, {});
      goAfresh(address);
    } catch {
      setAnswer('Not signed out. The server did not answer; try again.');
    }
  };
  return (
    <>
      <p className="mt-3">You are signed in as {signedInAs}; the invitation is for {neededEmail}.</p>
      <FormActions answer={answer}><Button kind="primary" onClick={signOut}>Sign out and go on as {neededEmail}</Button></FormActions>
    </>
  );
}
