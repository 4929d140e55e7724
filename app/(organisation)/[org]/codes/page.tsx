import { HydrationBoundary } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { CodesView } from '@/app/_components/codes/codes-view';
import { listQuery, single, type SearchParams } from '@/app/_components/lists/list-query';
import { answerOf, prefetch } from '@/app/_server/prefetch';
import { requireMember } from '@/app/_server/visit';
import { listCodesContract } from '@/lib/domain/codes/schema';
import { listCodes } from '@/lib/services/codes/list-codes';

export const metadata: Metadata = { title: 'Codes' };

interface CodesPageProps { params: Promise<{ org: string }>; searchParams: SearchParams }

export default async function CodesPage({ params, searchParams }: CodesPageProps) {
  const { org } = await params;
  const query = listQuery(single((await searchParams).cursor));
  const member = await requireMember(org);
  const state = await prefetch(answerOf(listCodesContract, { organisation: org, query }, listCodes(member, query)));
  return <HydrationBoundary state={state}><CodesView query={query} /></HydrationBoundary>;
}
