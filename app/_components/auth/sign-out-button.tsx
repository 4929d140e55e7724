'use client';

import { useState, type ReactNode } from 'react';
import { signOutContract, signOutEverywhereContract } from '@/lib/domain/people/schema';
import { callApi } from '../api/call-api';
import { FormActions } from '../forms/form-actions';
import { Button } from '../ui/button';
import { goAfresh } from './go-afresh';

interface SignOutButtonProps {
  /** Every session of the person ends, not this one alone. */
  everywhere?: boolean;
  /** Where the way leads on. */
  address?: string;
  children: ReactNode;
}

export function SignOutButton({ everywhere = false, address = '/', children }: SignOutButtonProps) {
  const [answer, setAnswer] = useState('');
  const signOut = async () => {
    try {
      await callApi(everywhere ? signOutEverywhereContract : signOutContract, {});
      goAfresh(address);
    } catch {
      setAnswer('Not signed out. The server did not answer; try again.');
    }
  };
  return <FormActions answer={answer}><Button kind={everywhere ? 'secondary' : 'primary'} onClick={signOut}>{children}</Button></FormActions>;
}
