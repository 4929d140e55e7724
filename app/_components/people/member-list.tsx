'use client';

import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { listMembersContract, removeMemberContract, type Member } from '@/lib/domain/members/schema';
import { Answered } from '../api/answered';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { problemOf } from '../api/problem-of';
import { useApi } from '../api/use-api';
import { goAfresh } from '../auth/go-afresh';
import { ProblemNotice } from '../forms/problem-notice';
import { PageLinks } from '../lists/page-links';
import { useOrganisation } from '../organisation/organisation-context';
import { HeadCell } from '../tables/cells';
import { Head, Table } from '../tables/table';
import { AskedOnce } from './asked-once';
import { ChangeRoles } from './change-roles';
import { MemberRow } from './member-row';

type Chosen = { member: Member; to: 'change' | 'remove' } | null;

function isLastOwner(member: Member, items: readonly Member[]): boolean {
  return member.roles.includes('owner') && items.filter(({ roles }) => roles.includes('owner')).length === 1;
}

export function MemberList({ query }: { query: { limit: number; cursor?: string } }) {
  const { slug, name, userId } = useOrganisation();
  const queries = useQueryClient();
  const members = useApi(listMembersContract, { organisation: slug, query });
  const [chosen, setChosen] = useState<Chosen>(null);
  const remove = useMutation({
    mutationFn: (member: Member) => callApi(removeMemberContract, { organisation: slug, params: { id: member.id } }),
    onSuccess: (_nothing, member) => {
      if (member.id === userId) goAfresh('/account');
      else setChosen(null);
    },
    onSettled: () => queries.invalidateQueries({ queryKey: apiKey(listMembersContract) }),
  });
  const close = () => {
    setChosen(null);
    remove.reset();
  };
  return (
    <Answered query={members}>
      {({ items, nextCursor }) => (
        <>
          <Table caption="Members." hideCaption>
            <Head><tr><HeadCell>E-mail</HeadCell><HeadCell>Is</HeadCell><HeadCell>Since</HeadCell><HeadCell>Sees</HeadCell><HeadCell><span className="sr-only">Change</span></HeadCell></tr></Head>
            <tbody>
              {items.map((member) => (
                <MemberRow key={member.id} member={member} isLastOwner={nextCursor === null && isLastOwner(member, items)} onChoose={(to) => setChosen({ member, to })} />
              ))}
            </tbody>
          </Table>
          <PageLinks nextCursor={nextCursor} />
          {chosen?.to === 'change' && <ChangeRoles key={chosen.member.id} member={chosen.member} onClose={close} />}
          {chosen?.to === 'remove' && (
            chosen.member.id === userId
              ? <AskedOnce question={`Leave ${name}?`} action={`Leave ${name}`} keep="Stay" isPending={remove.isPending} onDo={() => remove.mutate(chosen.member)} onKeep={close}>Your access ends now, and your tokens here stop working. What you did keeps your name. To come back you need an invitation.</AskedOnce>
              : <AskedOnce question={`Remove ${chosen.member.email}?`} action="Remove member" keep="Keep" isPending={remove.isPending} onDo={() => remove.mutate(chosen.member)} onKeep={close}>Their access ends now, and their tokens here stop working. What they did keeps their name. They are told by mail.</AskedOnce>
          )}
          <ProblemNotice problem={problemOf(remove.error, 'Not removed')} />
        </>
      )}
    </Answered>
  );
}
