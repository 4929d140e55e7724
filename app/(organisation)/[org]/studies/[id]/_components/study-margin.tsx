'use client';

import { useState } from 'react';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { DateTime } from '@/app/_components/ui/date-time';
import { Facts, LifeLines, type LifeStep } from '@/app/_components/ui/facts';
import { Hash } from '@/app/_components/ui/hash';
import { Provenance } from '@/app/_components/ui/provenance';
import { TextButton, TextLink } from '@/app/_components/ui/text-link';
import type { Study } from '@/lib/domain/studies/schema';
import { stateWords } from './state-words';

const life = ['collecting', 'assessing', 'assessed', 'in-review', 'signed'] as const;

function lifeSteps({ state, stateSince, revisedAt }: Study): LifeStep[] {
  const shown = state === 'assessment-failed' ? 'assessing' : state;
  const now = <DateTime value={stateSince} />;
  const place = life.findIndex((step) => step === shown);
  const steps = life.map((step, index): LifeStep => ({
    name: step === 'assessing' && state === 'assessment-failed' ? 'assessment failed' : step.replace('-', ' '),
    isCurrent: step === shown,
    when: step === shown ? now : index === 0 && place > 0 ? <DateTime value={revisedAt} /> : undefined,
  }));
  return place >= 0 ? steps : [...steps, { name: stateWords[state].toLowerCase(), isCurrent: true, when: now }];
}

/** The revision that is shown, with links to the others. */
function Revisions({ study: { id, revision, currentRevision } }: { study: Study }) {
  const { slug } = useOrganisation();
  const others = Array.from({ length: currentRevision }, (_, index) => index + 1).filter((each) => each !== revision).reverse();
  return (
    <>
      {revision}{revision < currentRevision && ` of ${currentRevision}`}
      {others.map((each, index) => (
        <span key={each}>
          {index === 0 ? ', see ' : ', '}
          <TextLink href={`/${slug}/studies/${id}${each === currentRevision ? '' : `?revision=${each}`}`}>{each}</TextLink>
        </span>
      ))}
    </>
  );
}

function Content({ hash }: { hash: string }) {
  const [answer, setAnswer] = useState('Copy');
  const copy = () => navigator.clipboard.writeText(hash).then(() => setAnswer('Copied'), () => setAnswer('Not copied'));
  return <><Hash value={hash} /> <TextButton onClick={() => void copy()} aria-label="Copy the content hash"><span aria-live="polite">{answer}</span></TextButton></>;
}

/** Who, when and which revisions: what a reader needs to find the same thing again. */
export function StudyMargin({ study }: { study: Study }) {
  const { slug } = useOrganisation();
  const { code, release, problem, rule, assessment } = study;
  return (
    <Provenance>
      <p className="mb-2 hidden text-ink wide:block"><b>{stateWords[study.state]}</b> since <DateTime value={study.stateSince} /></p>
      <LifeLines steps={lifeSteps(study)} />
      <div className="mt-3">
        <Facts
          facts={[
            { name: 'Revision', value: <Revisions study={study} /> },
            {
              name: 'Release',
              value: (
                <>
                  <TextLink href={`/${slug}/codes/${code.slug}`}>{code.name}</TextLink> {release.version}
                  {release.commit !== null && <code title={release.commit} className="block font-mono text-code">{release.commit.slice(0, 10)}</code>}
                </>
              ),
            },
            { name: 'Case', value: <><TextLink href={`/${slug}/cases/${study.case.slug}`}>revision {study.case.revision}</TextLink>{laterText(study.case)}</> },
            { name: 'Problem', value: <><TextLink href={`/${slug}/problems/${problem.slug}`}>revision {problem.revision}</TextLink>{laterText(problem)}</> },
            { name: 'Rule', value: `revision ${rule.revision}` },
            { name: 'Prepared', value: <span title={study.createdBy}>{study.createdBy.split('@')[0]}</span> },
            ...(assessment ? [
              { name: 'Content', value: <Content hash={assessment.inputsSha256} /> },
              { name: 'Numerics', value: `version ${assessment.numericsVersion}` },
            ] : []),
          ]}
        />
      </div>
    </Provenance>
  );
}

function laterText({ revision, currentRevision }: { revision: number; currentRevision: number }): string {
  return revision === currentRevision ? '' : `, now ${currentRevision}`;
}
