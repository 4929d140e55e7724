'use client';

import { lookUpInvitationContract, type OpenInvitation } from '@/lib/domain/invitations/schema';
import { roleWords } from '@/lib/domain/people/role-words';
import { Answered } from '../api/answered';
import { useLookUp } from '../api/use-look-up';
import { PageTitle } from '../ui/page-title';
import { Section } from '../ui/section';
import { TextLink } from '../ui/text-link';
import { DateTime } from '../ui/date-time';
import { JoinForm } from './join-form';
import { SignOutButton } from './sign-out-button';
import { useLinkToken } from './use-link-token';

const ended = {
  accepted: { title: 'Accepted already', text: 'This invitation was accepted.', way: <TextLink href="/sign-in">Sign in</TextLink> },
  revoked: { title: 'Revoked', text: 'This invitation was revoked. Ask whoever invited you for another.', way: <TextLink href="/">Go to the front page</TextLink> },
  expired: { title: 'Expired', text: 'This invitation has expired. Ask whoever invited you to send it again.', way: <TextLink href="/">Go to the front page</TextLink> },
} as const;

function Ended({ state }: { state: keyof typeof ended }) {
  const { title, text, way } = ended[state];
  return <><PageTitle>{title}</PageTitle><p className="mt-3">{text}</p><p className="mt-3">{way}</p></>;
}

function Offer({ invitation }: { invitation: OpenInvitation }) {
  const { email, roles, codes, until } = invitation;
  const isAuditor = roles.includes('auditor');
  return (
    <p className="mt-3">
      {invitation.invitedBy} invites {email} as <b>{roleWords(roles)}</b>.
      {isAuditor && <> You will see what is signed of {codes === null ? 'every code' : codes.join(', ')}{until !== null && <> until <DateTime value={until} /></>}.</>}
    </p>
  );
}

interface AcceptInvitationProps { token: string | null; signedInAs: string | null }

/** The page a link in an invitation leads to. */
export function AcceptInvitation({ token: given, signedInAs }: AcceptInvitationProps) {
  const token = useLinkToken(given);
  const offer = useLookUp(lookUpInvitationContract, token === null ? null : { token });
  if (token === null) {
    return <Section><PageTitle>Accept an invitation</PageTitle><p className="mt-3">Open the link in the mail again: it holds what is needed here.</p></Section>;
  }
  return (
    <Answered query={offer} inSection>
      {(invitation) => (
        <Section note={<p>An invitation is for its address. What you do in the organisation carries your name.</p>}>
          {invitation.state !== 'pending' ? <Ended state={invitation.state} /> : (
            <>
              <PageTitle>Join {invitation.organisation}</PageTitle>
              <Offer invitation={invitation} />
              {signedInAs !== null && signedInAs !== invitation.email
                ? (
                  <>
                    <p className="mt-3">You are signed in as {signedInAs}; the invitation is for {invitation.email}.</p>
                    <SignOutButton address={`/accept-invitation?token=${encodeURIComponent(token)}`}>Sign out and go on as {invitation.email}</SignOutButton>
                  </>
                )
                : <JoinForm token={token} invitation={invitation} isSignedIn={signedInAs !== null} />}
            </>
          )}
        </Section>
      )}
    </Answered>
  );
}
