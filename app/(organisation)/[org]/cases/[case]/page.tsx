import { HydrationBoundary } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { CaseView } from '@/app/_components/cases/case-view';
import { answerOf, prefetch } from '@/app/_server/prefetch';
import { orNotFound, requireMember } from '@/app/_server/visit';
import { getCaseContract } from '@/lib/domain/cases/schema';
import { getCase } from '@/lib/services/cases/get-case';

interface CasePageProps { params: Promise<{ org: string; case: string }> }

export async function generateMetadata({ params }: CasePageProps): Promise<Metadata> {
  const { org, case: key } = await params;
  return { title: (await orNotFound(getCase(await requireMember(org), key))).name };
}

export default async function CasePage({ params }: CasePageProps) {
  const { org: organisation, case: key } = await params;
  const member = await requireMember(organisation);
  const state = await prefetch(answerOf(getCaseContract, { organisation, params: { case: key } }, getCase(member, key)));
  return <HydrationBoundary state={state}><CaseView caseKey={key} /></HydrationBoundary>;
}
