'use client';

import { Dialog } from 'radix-ui';
import { useEffect, useRef } from 'react';
import type { Me } from '@/lib/domain/people/schema';
import { SignInForm } from '../auth/sign-in-form';
import { useOrganisation } from '../organisation/organisation-context';
import { Button } from '../ui/button';
import { accessLoss } from './access-loss';
import { useStore } from './create-store';
import { attendSession, sessionStanding, settleSession } from './session-gate';

/** Signing in on the page where the session ended, over everything that is typed there. */
export function SignInAgain() {
  const { email, userId } = useOrganisation();
  const standing = useStore(sessionStanding, 'there');
  const before = useRef<Element | null>(null);
  useEffect(attendSession, []);

  const arrive = (me: Me) => {
    if (me.id !== userId) accessLoss.set({ kind: 'other-person', me });
    settleSession('there', me.id === userId);
  };
  return (
    <Dialog.Root open={standing === 'asked'} onOpenChange={(isOpen) => { if (!isOpen) settleSession('put-off', false); }}>
      <Dialog.Portal>
        <Dialog.Overlay className="screen-only fixed inset-0 z-20 bg-paper/80" />
        <Dialog.Content
          onOpenAutoFocus={(event) => {
            before.current = document.activeElement;
            const secret = event.currentTarget instanceof HTMLElement ? event.currentTarget.querySelector<HTMLInputElement>('input[type=password]') : null;
            if (!secret) return;
            event.preventDefault();
            secret.focus();
          }}
          onCloseAutoFocus={(event) => {
            event.preventDefault();
            if (before.current instanceof HTMLElement) before.current.focus();
          }}
          className="screen-only fixed top-1/2 left-1/2 z-20 max-h-[calc(100vh-16px)] w-[min(420px,calc(100vw-32px))] -translate-x-1/2 -translate-y-1/2 overflow-y-auto border-[1.5px] border-ink bg-paper p-5 tablet:p-6"
        >
          <Dialog.Title className="font-serif text-section font-semibold">Sign in again</Dialog.Title>
          <Dialog.Description className="mt-2 mb-5">Your session has ended. What you typed is still on the page, and what you were doing goes on once you are signed in.</Dialog.Description>
          <SignInForm next={null} email={email} onSignedIn={arrive} others={<Dialog.Close asChild><Button>Not now</Button></Dialog.Close>} />
        </Dialog.Content>
      </Dialog.Portal>
    </Dialog.Root>
  );
}
