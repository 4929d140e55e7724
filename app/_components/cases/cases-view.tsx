'use client';

import { listCasesContract } from '@/lib/domain/cases/schema';
import { Answered } from '../api/answered';
import { useApi } from '../api/use-api';
import { PageLinks } from '../lists/page-links';
import { NeedsEngineer } from '../organisation/needs-engineer';
import { useOrganisation } from '../organisation/organisation-context';
import { OrganisationPage } from '../organisation/organisation-page';
import { ButtonLink } from '../ui/button-link';
import { EmptyState } from '../ui/empty-state';
import { PageTitle } from '../ui/page-title';
import { Section } from '../ui/section';
import { CaseTable } from './case-table';

export function CasesView({ query }: { query: { limit: number; cursor?: string } }) {
  const { slug, may } = useOrganisation();
  const cases = useApi(listCasesContract, { organisation: slug, query });
  const make = may('work.write') ? <ButtonLink href={`/${slug}/cases/new`} kind="primary">Make a case</ButtonLink> : <NeedsEngineer what="make a case" />;
  return (
    <OrganisationPage place={[{ label: 'Cases' }]}>
      <Section note={<p>A <b>case</b> is a code on a problem with named options, and what is promised about it.</p>}>
        <PageTitle>Cases</PageTitle>
        <div className="mt-6">
          <Answered query={cases}>
            {({ items, nextCursor }) => items.length === 0
              ? <EmptyState needed="A case needs a code and a problem." actions={make}>What your codes promise belongs here, problem by problem.</EmptyState>
              : <><CaseTable cases={items} /><PageLinks nextCursor={nextCursor} /><div className="mt-6">{make}</div></>}
          </Answered>
        </div>
      </Section>
    </OrganisationPage>
  );
}
