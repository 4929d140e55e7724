'use client';

import { useMutation, useQueryClient } from '@tanstack/react-query';
import { listInvitationsContract, resendInvitationContract, revokeInvitationContract, type Invitation } from '@/lib/domain/invitations/schema';
import { Answered } from '../api/answered';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { problemOf } from '../api/problem-of';
import { useApi } from '../api/use-api';
import { ProblemNotice } from '../forms/problem-notice';
import { useOrganisation } from '../organisation/organisation-context';
import { Cell, HeadCell, ReasonRow, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { DateTime } from '../ui/date-time';
import { TextButton } from '../ui/text-link';

const underWay = new Set(['queued', 'sending']);
const mailFaults = {
  sending: 'It is not known whether the mail went out. If it does not arrive, send the invitation again.',
  failed: 'The mail was refused. Check the address, then send the invitation again or revoke it.',
} as const;

function State({ invitation }: { invitation: Invitation }) {
  if (invitation.state === 'pending') return <>pending, until <DateTime value={invitation.expiresAt} /></>;
  return <>{invitation.state}</>;
}

function mailFault({ state, mail }: Invitation): string | null {
  if (state !== 'pending' || mail === null) return null;
  if (mail.state === 'failed') return `${mailFaults.failed} The server said: ${mail.fault ?? 'nothing'}`;
  return mail.state === 'sending' && mail.fault !== null ? mailFaults.sending : null;
}

export function InvitationList() {
  const { slug, may } = useOrganisation();
  const queries = useQueryClient();
  const invitations = useApi(listInvitationsContract, { organisation: slug, query: { limit: 50 } }, {
    refetchEvery: ({ items }) => (items.some(({ mail }) => underWay.has(mail?.state ?? '')) ? 2000 : false),
  });
  const settle = { onSettled: () => queries.invalidateQueries({ queryKey: apiKey(listInvitationsContract) }) };
  const target = ({ id }: Invitation) => ({ organisation: slug, params: { id } });
  const resend = useMutation({ mutationFn: (invitation: Invitation) => callApi(resendInvitationContract, target(invitation)), ...settle });
  const revoke = useMutation({ mutationFn: (invitation: Invitation) => callApi(revokeInvitationContract, target(invitation)), ...settle });
  return (
    <Answered query={invitations}>
      {({ items }) => items.length === 0
        ? <p className="text-graphite">Nobody was invited yet.</p>
        : (
          <>
            <Table caption="Invitations." hideCaption>
              <Head><tr><HeadCell>E-mail</HeadCell><HeadCell>As</HeadCell><HeadCell>State</HeadCell><HeadCell><span className="sr-only">Change</span></HeadCell></tr></Head>
              <tbody>
                {items.flatMap((invitation) => {
                  const fault = mailFault(invitation);
                  const isOpen = invitation.state === 'pending' || invitation.state === 'expired';
                  return [
                    <Row key={invitation.id}>
                      <RowHead className="min-w-48 [overflow-wrap:anywhere]">{invitation.email}</RowHead>
                      <Cell>{invitation.roles.join(', ')}</Cell>
                      <Cell><State invitation={invitation} />{underWay.has(invitation.mail?.state ?? '') && <span className="text-graphite">, mail on its way</span>}</Cell>
                      <Cell className="whitespace-nowrap">
                        {isOpen && may('people.manage') && (
                          <>
                            <TextButton aria-label={`Send the invitation of ${invitation.email} again`} onClick={() => resend.mutate(invitation)}>Send again</TextButton>
                            <TextButton className="ml-4" aria-label={`Revoke the invitation of ${invitation.email}`} onClick={() => revoke.mutate(invitation)}>Revoke</TextButton>
                          </>
                        )}
                      </Cell>
                    </Row>,
                    ...(fault === null ? [] : [<ReasonRow key={`${invitation.id} fault`} columns={4}>{fault}</ReasonRow>]),
                  ];
                })}
              </tbody>
            </Table>
            <ProblemNotice problem={problemOf(resend.error ?? revoke.error, 'Not changed')} />
          </>
        )}
    </Answered>
  );
}
