import { HydrationBoundary } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { single, type SearchParams } from '@/app/_components/lists/list-query';
import { answerOf, prefetch } from '@/app/_server/prefetch';
import { orNotFound, requireMember } from '@/app/_server/visit';
import { getStudyContract } from '@/lib/domain/studies/schema';
import { getStudy } from '@/lib/services/studies/get-study';
import { StudyView } from './_components/study-view';

interface StudyPageProps { params: Promise<{ org: string; id: string }>; searchParams: SearchParams }

export async function generateMetadata({ params }: StudyPageProps): Promise<Metadata> {
  const { org, id } = await params;
  const study = await orNotFound(getStudy(await requireMember(org), id));
  return { title: `${study.case.name}, ${study.code.name} ${study.release.version}` };
}

export default async function StudyPage({ params, searchParams }: StudyPageProps) {
  const { org: organisation, id } = await params;
  const asked = single((await searchParams).revision);
  const revision = asked === undefined ? undefined : Number(asked);
  if (revision !== undefined && !(Number.isSafeInteger(revision) && revision > 0)) notFound();
  const query = revision === undefined ? {} : { revision };
  const member = await requireMember(organisation);
  const state = await prefetch(answerOf(getStudyContract, { organisation, params: { id }, query }, getStudy(member, id, revision)));
  return <HydrationBoundary state={state}><StudyView id={id} revision={revision} /></HydrationBoundary>;
}
