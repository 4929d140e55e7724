import { HydrationBoundary } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { listQuery, single, type SearchParams } from '@/app/_components/lists/list-query';
import { TokensView } from '@/app/_components/tokens/tokens-view';
import { answerOf, prefetch } from '@/app/_server/prefetch';
import { requireMember } from '@/app/_server/visit';
import { rolesCarry } from '@/lib/domain/people/roles';
import { listTokensContract } from '@/lib/domain/tokens/schema';
import { listTokens } from '@/lib/services/tokens/list-tokens';

export const metadata: Metadata = { title: 'Tokens' };

interface TokensPageProps { params: Promise<{ org: string }>; searchParams: SearchParams }

export default async function TokensPage({ params, searchParams }: TokensPageProps) {
  const { org: organisation } = await params;
  const query = listQuery(single((await searchParams).cursor));
  const member = await requireMember(organisation);
  const answers = rolesCarry(member.roles, 'tokens.manage') ? [answerOf(listTokensContract, { organisation, query }, listTokens(member, query))] : [];
  return <HydrationBoundary state={await prefetch(...answers)}><TokensView query={query} /></HydrationBoundary>;
}
