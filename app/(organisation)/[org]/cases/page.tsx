import { HydrationBoundary } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { CasesView } from '@/app/_components/cases/cases-view';
import { listQuery, single, type SearchParams } from '@/app/_components/lists/list-query';
import { answerOf, prefetch } from '@/app/_server/prefetch';
import { requireMember } from '@/app/_server/visit';
import { listCasesContract } from '@/lib/domain/cases/schema';
import { listCases } from '@/lib/services/cases/list-cases';

export const metadata: Metadata = { title: 'Cases' };

interface CasesPageProps { params: Promise<{ org: string }>; searchParams: SearchParams }

export default async function CasesPage({ params, searchParams }: CasesPageProps) {
  const { org: organisation } = await params;
  const query = listQuery(single((await searchParams).cursor));
  const member = await requireMember(organisation);
  const state = await prefetch(answerOf(listCasesContract, { organisation, query }, listCases(member, query)));
  return <HydrationBoundary state={state}><CasesView query={query} /></HydrationBoundary>;
}
