'use client';

import { useState } from 'react';
import { getProblemContract, type Problem } from '@/lib/domain/problems/schema';
import { variablesOf } from '@/lib/domain/problems/variables';
import { Answered } from '../api/answered';
import { useApi } from '../api/use-api';
import { NeedsEngineer } from '../organisation/needs-engineer';
import { useOrganisation } from '../organisation/organisation-context';
import { OrganisationPage } from '../organisation/organisation-page';
import { Button } from '../ui/button';
import { ButtonLink } from '../ui/button-link';
import { DateTime } from '../ui/date-time';
import { Facts } from '../ui/facts';
import { PageTitle } from '../ui/page-title';
import { Provenance } from '../ui/provenance';
import { Section } from '../ui/section';
import { Sym } from '../ui/symbols';
import { NameLink } from '../ui/text-link';
import { equationNames } from './equation-names';
import { ExactFormula } from './exact-formula';
import { ProblemEdit } from './problem-edit';

export function ProblemView({ problem: key }: { problem: string }) {
  const { slug } = useOrganisation();
  const problem = useApi(getProblemContract, { organisation: slug, params: { problem: key } });
  // The revision that was opened, so that a later one does not sweep away what is typed.
  const [edited, setEdited] = useState<Problem | null>(null);
  return (
    <OrganisationPage
      place={[{ label: 'Problems', href: `/${slug}/problems` }, { label: problem.data?.name ?? key }]}
      stateLine={problem.data && `Revision ${problem.data.revision}`}
    >
      <Answered query={problem} inSection>
        {(found) => edited
          ? <ProblemEdit opened={edited} onClose={() => setEdited(null)} />
          : <ProblemDefinition problem={found} onEdit={() => setEdited(found)} />}
      </Answered>
    </OrganisationPage>
  );
}

function summaryOf({ equation, form, dimension, unsteady }: Problem): string {
  const name = equation === 'none' ? 'No equation stated' : `Equation: ${equationNames[equation]}${form ? `, ${form}` : ''}`;
  return `${name}. ${dimension} dimension${dimension === 1 ? '' : 's'}, ${unsteady ? 'unsteady' : 'steady'}.`;
}

function ProblemDefinition({ problem, onEdit }: { problem: Problem; onEdit: () => void }) {
  const { slug, may } = useOrganisation();
  const variables = variablesOf(problem);
  const exact = Object.entries(problem.exact ?? {});
  const constants = Object.entries(problem.constants);
  const domain = Object.entries(problem.domain ?? {});
  const margin = (
    <Provenance>
      <Facts
        facts={[
          { name: 'Revision', value: problem.revision },
          { name: 'Changed', value: <DateTime value={problem.changedAt} /> },
          { name: 'Made', value: <DateTime value={problem.createdAt} /> },
          { name: 'Short name', value: <code className="font-mono text-code">{problem.slug}</code> },
        ]}
      />
    </Provenance>
  );
  return (
    <>
      <Section note={margin}>
        <PageTitle under={summaryOf(problem)}>{problem.name}</PageTitle>
        <div className="mt-6 flex flex-wrap items-center gap-3">
          {may('work.write') ? <Button onClick={onEdit}>Change the problem</Button> : <NeedsEngineer what="change a problem" />}
        </div>
      </Section>
      <Section heading="Exact solution" note={exact.length > 0 && <p>Studies compare solver output with these, point by point.</p>}>
        {exact.length === 0
          ? <p className="text-graphite">None. Errors are computed in the solver and typed, or quantities are judged by their values.</p>
          : exact.map(([name, text]) => (
            <div key={name}>
              <ExactFormula name={name} text={text} of={variables} />
              <code className="block font-mono text-code break-words text-graphite">{name} = {text}</code>
            </div>
          ))}
      </Section>
      {constants.length > 0 && (
        <Section heading="Constants">{constants.map(([name, text]) => <ExactFormula key={name} name={name} text={String(text)} />)}</Section>
      )}
      {domain.length > 0 && (
        <Section heading="Domain">
          <p>{domain.map(([axis, interval], index) => interval && <span key={axis}>{index > 0 && ', '}<Sym>{axis}</Sym> from {interval[0]} to {interval[1]}</span>)}.</p>
        </Section>
      )}
      <Section heading="Cases on this problem">
        {problem.usedBy.length === 0 && <p className="text-graphite">None yet.</p>}
        <ul>{problem.usedBy.map((item) => <li key={item.id}><NameLink href={`/${slug}/cases/${item.slug}`}>{item.name}</NameLink></li>)}</ul>
        {may('work.write') && <p className="mt-4"><ButtonLink href={`/${slug}/cases/new?problem=${problem.slug}`}>Make a case</ButtonLink></p>}
      </Section>
    </>
  );
}
