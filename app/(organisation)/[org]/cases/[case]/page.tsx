import { HydrationBoundary } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { CaseView } from '@/app/_components/cases/case-view';
import { answerOf, prefetch } from '@/app/_server/prefetch';
import { orNotFound, requireMember } from '@/app/_server/visit';
import { getCaseContract } from '@/lib/domain/cases/schema';
import { listReleasesContract } from '@/lib/domain/codes/schema';
import { getProblemContract } from '@/lib/domain/problems/schema';
import { listStudiesContract } from '@/lib/domain/studies/schema';
import { getCase } from '@/lib/services/cases/get-case';
import { getProblem } from '@/lib/services/problems/get-problem';
import { listReleases } from '@/lib/services/releases/list-releases';
import { listStudies } from '@/lib/services/studies/list-studies';

interface CasePageProps { params: Promise<{ org: string; case: string }> }

export async function generateMetadata({ params }: CasePageProps): Promise<Metadata> {
  const { org, case: key } = await params;
  return { title: (await orNotFound(getCase(await requireMember(org), key))).name };
}

export default async function CasePage({ params }: CasePageProps) {
  const { org: organisation, case: key } = await params;
  const member = await requireMember(organisation);
  const found = await orNotFound(getCase(member, key));
  const [code, problem, all] = [found.code.slug, found.problem.slug, { limit: 200 }];
  const ofCase = { case: found.slug, limit: 200 };
  const state = await prefetch(
    answerOf(getCaseContract, { organisation, params: { case: key } }, Promise.resolve(found)),
    answerOf(getProblemContract, { organisation, params: { problem } }, getProblem(member, problem)),
    answerOf(listReleasesContract, { organisation, params: { code }, query: all }, listReleases(member, code, all)),
    answerOf(listStudiesContract, { organisation, query: ofCase }, listStudies(member, ofCase)),
  );
  return <HydrationBoundary state={state}><CaseView caseKey={key} /></HydrationBoundary>;
}
