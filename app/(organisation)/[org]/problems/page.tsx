import { HydrationBoundary } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { listQuery, single, type SearchParams } from '@/app/_components/lists/list-query';
import { ProblemsView } from '@/app/_components/problems/problems-view';
import { answerOf, prefetch } from '@/app/_server/prefetch';
import { requireMember } from '@/app/_server/visit';
import { listProblemsContract } from '@/lib/domain/problems/schema';
import { listProblems } from '@/lib/services/problems/list-problems';

export const metadata: Metadata = { title: 'Problems' };

interface ProblemsPageProps { params: Promise<{ org: string }>; searchParams: SearchParams }

export default async function ProblemsPage({ params, searchParams }: ProblemsPageProps) {
  const { org: organisation } = await params;
  const query = listQuery(single((await searchParams).cursor));
  const member = await requireMember(organisation);
  const state = await prefetch(answerOf(listProblemsContract, { organisation, query }, listProblems(member, query)));
  return <HydrationBoundary state={state}><ProblemsView query={query} /></HydrationBoundary>;
}
