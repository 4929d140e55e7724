'use client';

import { useState } from 'react';
import { signOutContract } from '@/lib/domain/people/schema';
import { callApi } from '../api/call-api';
import { FormActions } from '../forms/form-actions';
import { Button } from '../ui/button';
import { goAfresh } from './go-afresh';

export function SignOutButton() {
  const [answer, setAnswer] = useState('');
  const signOut = async () => {
    try {
      await callApi(signOutContract, {});
      goAfresh('/');
    } catch {
      setAnswer('Not signed out. The server did not answer; try again.');
    }
  };
  return <FormActions answer={answer}><Button kind="primary" onClick={signOut}>Sign out</Button></FormActions>;
}
