'use client';

import { Answered } from '@/app/_components/api/answered';
import { useApi } from '@/app/_components/api/use-api';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { OrganisationPage } from '@/app/_components/organisation/organisation-page';
import { getStudyContract, type Study } from '@/lib/domain/studies/schema';
import { stateWords } from './state-words';
import { StudySections } from './study-sections';
import { useStudyEvents } from './use-study-events';

interface StudyViewProps { id: string; revision?: number }

function placeOf(slug: string, study: Study) {
  return [
    { label: study.code.name, href: `/${slug}?code=${study.code.slug}` },
    { label: study.release.version, href: `/${slug}/studies?release=${encodeURIComponent(study.release.version)}` },
    { label: study.case.name, href: `/${slug}/cases/${study.case.slug}` },
    { label: study.revision === study.currentRevision ? 'study' : `study, revision ${study.revision}` },
  ];
}

/** The page of a study: kept up to date by its events while it changes by itself. */
export function StudyView({ id, revision }: StudyViewProps) {
  const { slug } = useOrganisation();
  const study = useApi(getStudyContract, { organisation: slug, params: { id }, query: revision === undefined ? {} : { revision } }, {
    refetchEvery: ({ waiting }) => (waiting ? 5000 : false),
  });
  const { readings, isInterrupted } = useStudyEvents(study.data);
  return (
    <OrganisationPage
      place={study.data ? placeOf(slug, study.data) : [{ label: 'Studies', href: `/${slug}/studies` }, { label: 'study' }]}
      stateLine={study.data && `${stateWords[study.data.state]}, revision ${study.data.revision}`}
    >
      {isInterrupted && <p role="status" className="screen-only mb-4 border-y border-rule py-[7px]"><b>Live updates are interrupted.</b> What stands here may be behind; they go on by themselves.</p>}
      <Answered query={study} inSection>{(found) => <StudySections study={found} readings={readings} />}</Answered>
    </OrganisationPage>
  );
}
