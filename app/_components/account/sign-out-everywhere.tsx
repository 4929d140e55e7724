'use client';

import { useState } from 'react';
import { signOutEverywhereContract } from '@/lib/domain/people/schema';
import { callApi } from '../api/call-api';
import { goAfresh } from '../auth/go-afresh';
import { FormActions } from '../forms/form-actions';
import { Button } from '../ui/button';

export function SignOutEverywhere() {
  const [answer, setAnswer] = useState('');
  const signOut = async () => {
    try {
      await callApi(signOutEverywhereContract, {});
      goAfresh('/sign-in');
    } catch {
      setAnswer('Not signed out. The server did not answer; try again.');
    }
  };
  return <FormActions answer={answer}><Button onClick={signOut}>Sign out everywhere</Button></FormActions>;
}
