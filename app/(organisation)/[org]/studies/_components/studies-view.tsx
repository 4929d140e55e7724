'use client';

import { Answered } from '@/app/_components/api/answered';
import { useApi } from '@/app/_components/api/use-api';
import { PageLinks } from '@/app/_components/lists/page-links';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { OrganisationPage } from '@/app/_components/organisation/organisation-page';
import { ButtonLink } from '@/app/_components/ui/button-link';
import { EmptyState } from '@/app/_components/ui/empty-state';
import { PageTitle } from '@/app/_components/ui/page-title';
import { Section } from '@/app/_components/ui/section';
import { listStudiesContract } from '@/lib/domain/studies/schema';
import type { StudiesQuery } from './studies-query';
import { StudyFilters } from './study-filters';
import { StudyTable } from './study-table';

/** All studies of the organisation, newest first; what is filtered stands in the address. */
export function StudiesView({ query }: { query: StudiesQuery }) {
  const { slug } = useOrganisation();
  const studies = useApi(listStudiesContract, { organisation: slug, query });
  const isFiltered = query.case !== undefined || query.release !== undefined || query.state !== undefined;
  return (
    <OrganisationPage place={[{ label: 'Studies' }]}>
      <Section note={<p>A study is one case on one release. It is started from the page of the case.</p>}>
        <PageTitle>Studies</PageTitle>
        <div className="mt-6"><StudyFilters query={query} /></div>
        <div className="mt-6">
          <Answered query={studies}>
            {({ items, nextCursor }) => (
              <>
                {items.length > 0 ? <StudyTable studies={items} /> : (
                  <EmptyState actions={isFiltered ? <ButtonLink href={`/${slug}/studies`}>Show all studies</ButtonLink> : <ButtonLink href={`/${slug}/cases`}>Choose a case</ButtonLink>}>
                    {isFiltered ? 'No study fits what is asked for.' : 'The studies of this organisation belong here, newest first.'}
                  </EmptyState>
                )}
                <PageLinks nextCursor={nextCursor} />
              </>
            )}
          </Answered>
        </div>
      </Section>
    </OrganisationPage>
  );
}
