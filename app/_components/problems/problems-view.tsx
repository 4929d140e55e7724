'use client';

import { listProblemsContract } from '@/lib/domain/problems/schema';
import { Answered } from '../api/answered';
import { useApi } from '../api/use-api';
import { PageLinks } from '../lists/page-links';
import { NeedsEngineer } from '../organisation/needs-engineer';
import { useOrganisation } from '../organisation/organisation-context';
import { OrganisationPage } from '../organisation/organisation-page';
import { Cell, HeadCell, Missing, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { ButtonLink } from '../ui/button-link';
import { EmptyState } from '../ui/empty-state';
import { PageTitle } from '../ui/page-title';
import { Section } from '../ui/section';
import { Sym } from '../ui/symbols';
import { NameLink } from '../ui/text-link';
import { equationNames } from './equation-names';

function ExactNames({ names }: { names: readonly string[] }) {
  if (names.length === 0) return <Missing reason="No exact solution" />;
  return names.map((name, index) => <span key={name}>{index > 0 && ', '}<Sym>{name}</Sym></span>);
}

export function ProblemsView({ query }: { query: { limit: number; cursor?: string } }) {
  const { slug, may } = useOrganisation();
  const problems = useApi(listProblemsContract, { organisation: slug, query });
  const make = may('work.write') ? <ButtonLink href={`/${slug}/problems/new`} kind="primary">Make a problem</ButtonLink> : <NeedsEngineer what="make a problem" />;
  return (
    <OrganisationPage place={[{ label: 'Problems' }]}>
      <Section note={<p>A <b>problem</b> is what is solved: equations, constants, domain, and an exact or manufactured solution. Cases of every code may share it.</p>}>
        <PageTitle>Problems</PageTitle>
        <div className="mt-6">
          <Answered query={problems}>
            {({ items, nextCursor }) => items.length === 0
              ? <EmptyState needed="An exact solution lets solver output be compared point by point." actions={make}>The problems your codes are run on belong here.</EmptyState>
              : (
                <>
                  <Table caption="Problems of the organisation." hideCaption>
                    <Head><tr><HeadCell>Name</HeadCell><HeadCell>Equation</HeadCell><HeadCell>Exact fields</HeadCell><HeadCell num>Dimensions</HeadCell><HeadCell num>Cases</HeadCell><HeadCell num>Revision</HeadCell></tr></Head>
                    <tbody>
                      {items.map((problem) => (
                        <Row key={problem.id} isLinked>
                          <RowHead className="min-w-40"><NameLink href={`/${slug}/problems/${problem.slug}`}>{problem.name}</NameLink></RowHead>
                          <Cell className="min-w-32">{equationNames[problem.equation]}</Cell>
                          <Cell><ExactNames names={Object.keys(problem.exact ?? {})} /></Cell>
                          <Cell num>{problem.dimension}{problem.unsteady && ' and t'}</Cell>
                          <Cell num>{problem.usedBy.length}</Cell>
                          <Cell num>{problem.revision}</Cell>
                        </Row>
                      ))}
                    </tbody>
                  </Table>
                  <PageLinks nextCursor={nextCursor} />
                  <div className="mt-6">{make}</div>
                </>
              )}
          </Answered>
        </div>
      </Section>
    </OrganisationPage>
  );
}
