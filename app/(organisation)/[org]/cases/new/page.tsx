import { HydrationBoundary } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { CaseNew } from '@/app/_components/cases/case-new';
import { single, type SearchParams } from '@/app/_components/lists/list-query';
import { answerOf, prefetch } from '@/app/_server/prefetch';
import { requireMember } from '@/app/_server/visit';
import { listCodesContract } from '@/lib/domain/codes/schema';
import { listProblemsContract } from '@/lib/domain/problems/schema';
import { listCodes } from '@/lib/services/codes/list-codes';
import { listProblems } from '@/lib/services/problems/list-problems';

export const metadata: Metadata = { title: 'New case' };

interface NewCasePageProps { params: Promise<{ org: string }>; searchParams: SearchParams }

export default async function NewCasePage({ params, searchParams }: NewCasePageProps) {
  const { org: organisation } = await params;
  const { code, problem } = await searchParams;
  const member = await requireMember(organisation);
  const query = { limit: 200 };
  const state = await prefetch(
    answerOf(listCodesContract, { organisation, query }, listCodes(member, query)),
    answerOf(listProblemsContract, { organisation, query }, listProblems(member, query)),
  );
  return <HydrationBoundary state={state}><CaseNew chosen={{ code: single(code) ?? '', problem: single(problem) ?? '' }} /></HydrationBoundary>;
}
