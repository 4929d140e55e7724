'use client';

import type { ReactNode } from 'react';
import { roleWords } from '@/lib/domain/people/role-words';
import { arrivalAddress } from '../auth/arrive';
import { goAfresh } from '../auth/go-afresh';
import { useOrganisation } from '../organisation/organisation-context';
import { TextButton } from '../ui/text-link';
import { accessLoss, type AccessLoss } from './access-loss';
import { useStore } from './create-store';
import { missingWords } from './services-words';
import { sessionStanding } from './session-gate';
import { useStayWhileOffline } from './stay-while-offline';
import { useMissingServices } from './use-missing-services';
import { useOnline } from './use-online';

const kept = 'What you typed is still here to copy.';

function Line({ title, children, action }: { title: string; children: ReactNode; action?: ReactNode }) {
  return (
    <div className="screen-only sticky top-0 z-10 border-b border-rule bg-wash">
      <p role="alert" className="bar-frame py-2 text-table"><b>{title}</b> {children} {action}</p>
    </div>
  );
}

function LostAccess({ loss }: { loss: AccessLoss }) {
  const { name, email } = useOrganisation();
  if (loss.kind === 'fewer-roles') {
    const action = <TextButton onClick={() => window.location.reload()}>Load the page again</TextButton>;
    return <Line title={`Your roles in ${name} have changed.`} action={action}>You are {roleWords(loss.roles)} now; what needs another role is refused. {kept}</Line>;
  }
  const home = loss.me.organisations[0];
  const action = <TextButton onClick={() => goAfresh(arrivalAddress(loss.me, null))}>{home ? `Go to ${home.name}` : 'Go to the front page'}</TextButton>;
  if (loss.kind === 'removed') return <Line title={`You are no longer a member of ${name}.`} action={action}>Nothing more is saved from this page. {kept}</Line>;
  return <Line title={`${loss.me.email} is signed in now.`} action={action}>This page was opened by {email}, and nothing more is saved from it. {kept}</Line>;
}

function MissingServices() {
  const { missing, askAgain } = useMissingServices();
  const [first] = missing;
  if (first === undefined) return null;
  const isNothingLeft = missing.includes('server') || missing.includes('database');
  const names = isNothingLeft ? missing.filter((name) => name === 'server' || name === 'database') : missing;
  return (
    <Line title={missingWords[names[0] ?? first].title} action={<TextButton onClick={askAgain}>Try again now</TextButton>}>
      {missingWords[names[0] ?? first].text}{names.slice(1).map((name) => ` ${missingWords[name].title} ${missingWords[name].text}`)}
      {isNothingLeft && <> What you typed is still here; a quick check that is open goes on, it stays in the browser.</>} This page tries again by itself.
    </Line>
  );
}

/** One line under the bar on what keeps this page from being the present state: the gravest thing only. */
export function StandingLine() {
  const loss = useStore(accessLoss, null);
  const session = useStore(sessionStanding, 'there');
  const isOnline = useOnline();
  const wasStopped = useStayWhileOffline(!isOnline);
  if (loss) return <LostAccess loss={loss} />;
  if (!isOnline) {
    return <Line title="You are offline.">{wasStopped && 'That page cannot be loaded now. '}What you typed is still here; reading goes on by itself once the connection is back.</Line>;
  }
  if (session === 'put-off') {
    return <Line title="Your session has ended." action={<TextButton onClick={() => sessionStanding.set('asked')}>Sign in again</TextButton>}>Nothing is read or saved until you are signed in. {kept}</Line>;
  }
  return <MissingServices />;
}
