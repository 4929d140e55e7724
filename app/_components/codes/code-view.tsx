'use client';

import { listCasesContract } from '@/lib/domain/cases/schema';
import { getCodeContract, listReleasesContract } from '@/lib/domain/codes/schema';
import { Answered } from '../api/answered';
import { useApi } from '../api/use-api';
import { CaseTable } from '../cases/case-table';
import { PageLinks } from '../lists/page-links';
import { NeedsEngineer } from '../organisation/needs-engineer';
import { useOrganisation } from '../organisation/organisation-context';
import { OrganisationPage } from '../organisation/organisation-page';
import { ButtonLink } from '../ui/button-link';
import { DateTime } from '../ui/date-time';
import { EmptyState } from '../ui/empty-state';
import { Facts } from '../ui/facts';
import { PageTitle } from '../ui/page-title';
import { Provenance } from '../ui/provenance';
import { Section } from '../ui/section';
import { TextLink } from '../ui/text-link';
import { ReleaseForm } from './release-form';
import { ReleaseTable } from './release-table';

interface CodeViewProps {
  code: string;
  releaseQuery: { limit: number; cursor?: string };
  caseQuery: { code: string; limit: number };
}

export function CodeView({ code: key, releaseQuery, caseQuery }: CodeViewProps) {
  const { slug, may } = useOrganisation();
  const code = useApi(getCodeContract, { organisation: slug, params: { code: key } });
  const releases = useApi(listReleasesContract, { organisation: slug, params: { code: key }, query: releaseQuery });
  const cases = useApi(listCasesContract, { organisation: slug, query: caseQuery });
  const mayWrite = may('work.write');
  const name = code.data?.name ?? key;
  const newCase = `/${slug}/cases/new?code=${encodeURIComponent(key)}`;
  const margin = code.data && (
    <Provenance title="About this code">
      <Facts facts={[{ name: 'Short name', value: <code className="font-mono text-code">{code.data.slug}</code> }, { name: 'Made', value: <DateTime value={code.data.createdAt} /> }]} />
    </Provenance>
  );
  return (
    <OrganisationPage place={[{ label: 'Codes', href: `/${slug}/codes` }, { label: name }]}>
      <Section note={margin}>
        <PageTitle>{name}</PageTitle>
        <p className="mt-3"><TextLink href={`/${slug}?code=${encodeURIComponent(key)}`}>Release matrix</TextLink></p>
      </Section>
      <Section heading="Releases" note={<p>A release is <b>planned</b>, then <b>current</b>; several may be current at once. A <b>withdrawn</b> one stands no more.</p>}>
        <Answered query={releases}>
          {({ items, nextCursor }) => (
            <>
              {items.length === 0
                ? <EmptyState needed="A study runs a case on one release.">The versions of {name} belong here.</EmptyState>
                : <ReleaseTable code={key} releases={items} mayChange={mayWrite} />}
              <PageLinks nextCursor={nextCursor} />
            </>
          )}
        </Answered>
        <div className="mt-6">{mayWrite ? <ReleaseForm code={key} /> : <NeedsEngineer what="make or change a release" />}</div>
      </Section>
      <Section heading="Cases">
        <Answered query={cases}>
          {({ items }) => items.length === 0
            ? (
              <EmptyState
                needed="It declares formal orders, tolerances and grids before any data."
                actions={mayWrite ? <ButtonLink href={newCase}>Make a case</ButtonLink> : undefined}
              >
                What is verified about {name} belongs here: a problem it solves, with the options it uses.
              </EmptyState>
            )
            : (
              <>
                <CaseTable cases={items} withoutCode />
                {mayWrite && <p className="mt-4"><ButtonLink href={newCase}>Make a case</ButtonLink></p>}
              </>
            )}
        </Answered>
      </Section>
    </OrganisationPage>
  );
}
