import { HydrationBoundary } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { ProblemView } from '@/app/_components/problems/problem-view';
import { answerOf, prefetch } from '@/app/_server/prefetch';
import { orNotFound, requireMember } from '@/app/_server/visit';
import { getProblemContract } from '@/lib/domain/problems/schema';
import { getProblem } from '@/lib/services/problems/get-problem';

interface ProblemPageProps { params: Promise<{ org: string; problem: string }> }

export async function generateMetadata({ params }: ProblemPageProps): Promise<Metadata> {
  const { org, problem } = await params;
  return { title: (await orNotFound(getProblem(await requireMember(org), problem))).name };
}

export default async function ProblemPage({ params }: ProblemPageProps) {
  const { org: organisation, problem } = await params;
  const member = await requireMember(organisation);
  const state = await prefetch(answerOf(getProblemContract, { organisation, params: { problem } }, getProblem(member, problem)));
  return <HydrationBoundary state={state}><ProblemView problem={problem} /></HydrationBoundary>;
}
