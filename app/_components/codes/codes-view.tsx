'use client';

import { listCodesContract } from '@/lib/domain/codes/schema';
import { Answered } from '../api/answered';
import { useApi } from '../api/use-api';
import { PageLinks } from '../lists/page-links';
import { NeedsEngineer } from '../organisation/needs-engineer';
import { useOrganisation } from '../organisation/organisation-context';
import { OrganisationPage } from '../organisation/organisation-page';
import { Cell, HeadCell, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { DateTime } from '../ui/date-time';
import { EmptyState } from '../ui/empty-state';
import { PageTitle } from '../ui/page-title';
import { Section } from '../ui/section';
import { NameLink } from '../ui/text-link';
import { CodeForm } from './code-form';

export function CodesView({ query }: { query: { limit: number; cursor?: string } }) {
  const { slug, may } = useOrganisation();
  const codes = useApi(listCodesContract, { organisation: slug, query });
  return (
    <OrganisationPage place={[{ label: 'Codes' }]}>
      <Section note={<p>A <b>code</b> is a solver under verification. Its releases and cases belong to it.</p>}>
        <PageTitle>Codes</PageTitle>
        <div className="mt-6">
          <Answered query={codes}>
            {({ items, nextCursor }) => items.length === 0
              ? <EmptyState needed="A release and a case are needed before a study can be made.">The solvers of your organisation belong here.</EmptyState>
              : (
                <>
                  <Table caption="Codes of the organisation." hideCaption>
                    <Head><tr><HeadCell>Name</HeadCell><HeadCell>Short name</HeadCell><HeadCell>Matrix</HeadCell><HeadCell>Made</HeadCell></tr></Head>
                    <tbody>
                      {items.map((code) => (
                        <Row key={code.id} isLinked>
                          <RowHead><NameLink href={`/${slug}/codes/${code.slug}`}>{code.name}</NameLink></RowHead>
                          <Cell><code className="font-mono text-code">{code.slug}</code></Cell>
                          <Cell><NameLink href={`/${slug}?code=${code.slug}`}>Release matrix</NameLink></Cell>
                          <Cell><DateTime value={code.createdAt} /></Cell>
                        </Row>
                      ))}
                    </tbody>
                  </Table>
                  <PageLinks nextCursor={nextCursor} />
                </>
              )}
          </Answered>
        </div>
      </Section>
      <Section heading="Make a code">{may('work.write') ? <CodeForm /> : <NeedsEngineer what="make a code" />}</Section>
    </OrganisationPage>
  );
}
