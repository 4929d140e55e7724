'use client';

import type { CaseKind } from '@/lib/domain/cases/definition';
import type { Case } from '@/lib/domain/cases/schema';
import { listReleasesContract } from '@/lib/domain/codes/schema';
import { listStudiesContract, type StudySummary } from '@/lib/domain/studies/schema';
import { Answered } from '../api/answered';
import { useApi } from '../api/use-api';
import { useOrganisation } from '../organisation/organisation-context';
import { markOfOutcome } from '../studies/mark-of-outcome';
import { Cell, HeadCell, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { DateTime } from '../ui/date-time';
import { EmptyState } from '../ui/empty-state';
import { OutcomeWord } from '../ui/outcome-word';
import { ButtonLink } from '../ui/button-link';
import { NameLink } from '../ui/text-link';
import { StartStudy } from './start-study';

function StudyOutcome({ study, kind }: { study: StudySummary; kind: CaseKind }) {
  const mark = markOfOutcome(study.outcome, { kind, reasons: study.reasons });
  return mark === null ? <span className="text-graphite">{study.state.replace('-', ' ')}</span> : <OutcomeWord mark={mark} lineStart />;
}

/** The studies of a case, release by release; where a release has none, the way to start one. */
export function ReleaseStudies({ found }: { found: Case }) {
  const { slug, may } = useOrganisation();
  const releases = useApi(listReleasesContract, { organisation: slug, params: { code: found.code.slug }, query: { limit: 200 } });
  const studies = useApi(listStudiesContract, { organisation: slug, query: { case: found.slug, limit: 200 } });
  const mayStart = may('work.write');
  return (
    <Answered query={releases}>
      {({ items: versions }) => (
        <Answered query={studies}>
          {({ items }) => versions.length === 0
            ? <EmptyState actions={mayStart ? <ButtonLink href={`/${slug}/codes/${found.code.slug}`}>Make a release</ButtonLink> : undefined}>A study runs this case on a release; {found.code.name} has none yet.</EmptyState>
            : (
              <Table caption="Studies of this case by release, newest first." hideCaption>
                <Head><tr><HeadCell>Release</HeadCell><HeadCell>Outcome</HeadCell><HeadCell num>Revision</HeadCell><HeadCell afterNumber>Since</HeadCell><HeadCell>Study</HeadCell></tr></Head>
                <tbody>
                  {versions.flatMap(({ version, state }) => {
                    const own = items.filter(({ release }) => release.version === version);
                    if (own.length === 0) {
                      const isOpen = mayStart && state !== 'withdrawn';
                      return [
                        <Row key={version} startsGroup>
                          <RowHead>{version}</RowHead><Cell className="text-graphite">not run</Cell><Cell /><Cell />
                          <Cell>{isOpen && found.gridPlan.length > 0 ? <StartStudy found={found} release={version} /> : isOpen && <span className="text-graphite">needs a grid plan</span>}</Cell>
                        </Row>,
                      ];
                    }
                    return own.map((study, index) => (
                      <Row key={study.id} startsGroup={index === 0} isLinked>
                        <RowHead>{index === 0 && version}</RowHead>
                        <Cell><StudyOutcome study={study} kind={found.kind} /></Cell>
                        <Cell num>{study.revision}</Cell>
                        <Cell afterNumber><DateTime value={study.stateSince} /></Cell>
                        <Cell><NameLink href={`/${slug}/studies/${study.id}`} className="underline">Open the study</NameLink></Cell>
                      </Row>
                    ));
                  })}
                </tbody>
              </Table>
            )}
        </Answered>
      )}
    </Answered>
  );
}
