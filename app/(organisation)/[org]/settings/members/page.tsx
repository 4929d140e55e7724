import { HydrationBoundary } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { listQuery, single, type SearchParams } from '@/app/_components/lists/list-query';
import { MembersView } from '@/app/_components/people/members-view';
import { answerOf, prefetch } from '@/app/_server/prefetch';
import { requireMember } from '@/app/_server/visit';
import { listInvitationsContract } from '@/lib/domain/invitations/schema';
import { listMembersContract } from '@/lib/domain/members/schema';
import { rolesCarry } from '@/lib/domain/people/roles';
import { listInvitations } from '@/lib/services/invitations/list-invitations';
import { listMembers } from '@/lib/services/members/list-members';

export const metadata: Metadata = { title: 'Members' };

interface MembersPageProps { params: Promise<{ org: string }>; searchParams: SearchParams }

export default async function MembersPage({ params, searchParams }: MembersPageProps) {
  const { org: organisation } = await params;
  const query = listQuery(single((await searchParams).cursor));
  const member = await requireMember(organisation);
  const first = { limit: 50 };
  const answers = rolesCarry(member.roles, 'people.read')
    ? [
      answerOf(listMembersContract, { organisation, query }, listMembers(member, query)),
      answerOf(listInvitationsContract, { organisation, query: first }, listInvitations(member, first)),
    ]
    : [];
  return <HydrationBoundary state={await prefetch(...answers)}><MembersView query={query} /></HydrationBoundary>;
}
