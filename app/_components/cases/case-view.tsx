'use client';

import { useState } from 'react';
import { getCaseContract, type Case } from '@/lib/domain/cases/schema';
import { getProblemContract } from '@/lib/domain/problems/schema';
import { builtInRule } from '@/lib/domain/rules/built-in-rule';
import { Answered } from '../api/answered';
import { useApi } from '../api/use-api';
import { NeedsEngineer } from '../organisation/needs-engineer';
import { useOrganisation } from '../organisation/organisation-context';
import { OrganisationPage } from '../organisation/organisation-page';
import { Button } from '../ui/button';
import { DateTime } from '../ui/date-time';
import { Facts } from '../ui/facts';
import { PageTitle } from '../ui/page-title';
import { Provenance } from '../ui/provenance';
import { Section } from '../ui/section';
import { TextLink } from '../ui/text-link';
import { CaseEdit } from './case-edit';
import { ColumnsTable } from './columns-table';
import { DeclaredTable } from './declared-table';
import { GridPlanTable } from './grid-plan-table';
import { QuantitiesTable } from './quantities-table';
import { ReleaseStudies } from './release-studies';

const outputWords = { point: 'The output holds values at points.', average: 'The output holds cell averages.', quadrature: 'The output holds values at quadrature points.' } as const;

export function CaseView({ caseKey }: { caseKey: string }) {
  const { slug } = useOrganisation();
  const query = useApi(getCaseContract, { organisation: slug, params: { case: caseKey } });
  // The revision that was opened, so that a later one does not sweep away what is typed.
  const [edited, setEdited] = useState<Case | null>(null);
  const found = query.data;
  const place = found
    ? [{ label: found.code.name, href: `/${slug}/codes/${found.code.slug}` }, { label: found.name }]
    : [{ label: 'Cases', href: `/${slug}/cases` }, { label: caseKey }];
  return (
    <OrganisationPage place={place} stateLine={found && `Revision ${found.revision}`}>
      <Answered query={query} inSection>
        {(each) => edited
          ? <CaseEdit opened={edited} onClose={() => setEdited(null)} />
          : <CaseDefinitionView found={each} onEdit={() => setEdited(each)} />}
      </Answered>
    </OrganisationPage>
  );
}

function Margin({ found }: { found: Case }) {
  const facts = [
    { name: 'Revision', value: found.revision },
    { name: 'Changed', value: <DateTime value={found.changedAt} /> },
    { name: 'Made', value: <DateTime value={found.createdAt} /> },
    { name: 'Short name', value: <code className="font-mono text-code">{found.slug}</code> },
    ...(found.requirements.length > 0 ? [{ name: 'Requires', value: found.requirements.join(', ') }] : []),
  ];
  return <Provenance><Facts facts={facts} /></Provenance>;
}

function CaseDefinitionView({ found, onEdit }: { found: Case; onEdit: () => void }) {
  const { slug, may } = useOrganisation();
  const problem = useApi(getProblemContract, { organisation: slug, params: { problem: found.problem.slug } });
  const options = Object.entries(found.options);
  const grids = found.minimumGrids ?? builtInRule.minimumGrids;
  const kind = `${found.kind.charAt(0).toUpperCase()}${found.kind.slice(1)} case`;
  return (
    <>
      <Section note={<Margin found={found} />}>
        <PageTitle under={<>{kind} of <TextLink href={`/${slug}/codes/${found.code.slug}`}>{found.code.name}</TextLink> on <TextLink href={`/${slug}/problems/${found.problem.slug}`}>{found.problem.name}</TextLink>.</>}>{found.name}</PageTitle>
        {options.length > 0 && <p className="mt-3">{options.map(([name, choice]) => `${name}: ${choice}`).join('; ')}.</p>}
        <div className="mt-6">{may('work.write') ? <Button onClick={onEdit}>Change the case</Button> : <NeedsEngineer what="change a case" />}</div>
      </Section>
      <Section heading="Studies over releases"><ReleaseStudies found={found} /></Section>
      {found.fields.length > 0 && (
        <Section
          heading="Declared"
          note={<p>An outcome needs <b>{grids} grids</b>{found.minimumGrids === undefined ? ', as the rule says' : ''}.{found.sampling && ` ${outputWords[found.sampling]}`}{found.elements && ` Finite elements of degree ${found.elements.degree}: orders that are not stated are theirs.`}</p>}
        >
          <DeclaredTable definition={found} />
        </Section>
      )}
      {found.quantities.length > 0 && <Section heading="Quantities" note={found.kind === 'solution' && <p>A solution case shows how uncertain a quantity is. It is no evidence that an option is verified.</p>}><QuantitiesTable quantities={found.quantities} /></Section>}
      <Section heading="Grid plan" note={found.gridPlan.length > 0 && <p>Frozen for a study when its first data arrives.</p>}>
        {found.gridPlan.length > 0
          ? <GridPlanTable gridPlan={found.gridPlan} dimension={problem.data?.dimension ?? 1} />
          : <p className="text-graphite">None yet. Change the case to plan its grids; a study starts from them.</p>}
      </Section>
      <Section heading="Columns of the output" note={<p>Mapped once, with the first upload that needs it, and remembered.</p>}>
        {found.columns ? <ColumnsTable columns={found.columns} /> : <p className="text-graphite">Not mapped yet. Names that match map themselves.</p>}
      </Section>
    </>
  );
}
