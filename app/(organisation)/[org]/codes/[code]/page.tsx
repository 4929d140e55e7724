import { HydrationBoundary } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { CodeView } from '@/app/_components/codes/code-view';
import { listQuery, single, type SearchParams } from '@/app/_components/lists/list-query';
import { answerOf, prefetch } from '@/app/_server/prefetch';
import { orNotFound, requireMember } from '@/app/_server/visit';
import { listCasesContract } from '@/lib/domain/cases/schema';
import { getCodeContract, listReleasesContract } from '@/lib/domain/codes/schema';
import { listCases } from '@/lib/services/cases/list-cases';
import { getCode } from '@/lib/services/codes/get-code';
import { listReleases } from '@/lib/services/releases/list-releases';

interface CodePageProps { params: Promise<{ org: string; code: string }>; searchParams: SearchParams }

export async function generateMetadata({ params }: CodePageProps): Promise<Metadata> {
  const { org, code } = await params;
  return { title: (await orNotFound(getCode(await requireMember(org), code))).name };
}

export default async function CodePage({ params, searchParams }: CodePageProps) {
  const { org: organisation, code } = await params;
  const releaseQuery = listQuery(single((await searchParams).cursor));
  const caseQuery = { code, limit: 200 };
  const member = await requireMember(organisation);
  const state = await prefetch(
    answerOf(getCodeContract, { organisation, params: { code } }, getCode(member, code)),
    answerOf(listReleasesContract, { organisation, params: { code }, query: releaseQuery }, listReleases(member, code, releaseQuery)),
    answerOf(listCasesContract, { organisation, query: caseQuery }, listCases(member, caseQuery)),
  );
  return <HydrationBoundary state={state}><CodeView code={code} releaseQuery={releaseQuery} caseQuery={caseQuery} /></HydrationBoundary>;
}
