import { HydrationBoundary } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { listQuery, single, type SearchParams } from '@/app/_components/lists/list-query';
import { answerOf, prefetch } from '@/app/_server/prefetch';
import { requireMember } from '@/app/_server/visit';
import { listStudiesContract, studyStateSchema } from '@/lib/domain/studies/schema';
import { listStudies } from '@/lib/services/studies/list-studies';
import { StudiesView } from './_components/studies-view';

export const metadata: Metadata = { title: 'Studies' };

interface StudiesPageProps { params: Promise<{ org: string }>; searchParams: SearchParams }

export default async function StudiesPage({ params, searchParams }: StudiesPageProps) {
  const { org: organisation } = await params;
  const asked = await searchParams;
  const state = studyStateSchema.safeParse(single(asked.state)).data;
  const [ofCase, release] = [single(asked.case), single(asked.release)];
  const query = {
    ...listQuery(single(asked.cursor)),
    ...(ofCase === undefined ? {} : { case: ofCase }), ...(release === undefined ? {} : { release }), ...(state === undefined ? {} : { state }),
  };
  const member = await requireMember(organisation);
  const answers = await prefetch(answerOf(listStudiesContract, { organisation, query }, listStudies(member, query)));
  return <HydrationBoundary state={answers}><StudiesView query={query} /></HydrationBoundary>;
}
