'use client';

import { useApi } from '@/app/_components/api/use-api';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { markOfOutcome } from '@/app/_components/studies/mark-of-outcome';
import { Cell, HeadCell, RowHead } from '@/app/_components/tables/cells';
import { Head, Row, Table } from '@/app/_components/tables/table';
import { DateTime } from '@/app/_components/ui/date-time';
import { OutcomeWord } from '@/app/_components/ui/outcome-word';
import { NameLink } from '@/app/_components/ui/text-link';
import { listCasesContract } from '@/lib/domain/cases/schema';
import type { StudySummary } from '@/lib/domain/studies/schema';

export function StudyTable({ studies }: { studies: readonly StudySummary[] }) {
  const { slug } = useOrganisation();
  // The filter above reads the same list, so this costs nothing; only the mark of an open solution case depends on it.
  const cases = useApi(listCasesContract, { organisation: slug, query: { limit: 200 } });
  const kindOf = (id: string) => cases.data?.items.find((item) => item.id === id)?.kind;
  return (
    <Table caption="Studies, newest first." hideCaption>
      <Head>
        <tr><HeadCell>Case</HeadCell><HeadCell>Outcome</HeadCell><HeadCell>Code and release</HeadCell><HeadCell>State</HeadCell><HeadCell num>Revision</HeadCell><HeadCell afterNumber>Since</HeadCell></tr>
      </Head>
      <tbody>
        {studies.map((study) => {
          const mark = markOfOutcome(study.outcome, { kind: kindOf(study.case.id), reasons: study.reasons });
          return (
            <Row key={study.id} isLinked>
              <RowHead className="min-w-40"><NameLink href={`/${slug}/studies/${study.id}`}>{study.case.name}</NameLink></RowHead>
              <Cell className="whitespace-nowrap">{mark === null ? <span className="text-graphite">none yet</span> : <OutcomeWord mark={mark} />}</Cell>
              <Cell className="whitespace-nowrap"><NameLink href={`/${slug}/codes/${study.code.slug}`}>{study.code.name}</NameLink> {study.release.version}</Cell>
              <Cell className="whitespace-nowrap">{study.state.replace('-', ' ')}</Cell>
              <Cell num>{study.revision}</Cell>
              <Cell afterNumber><DateTime value={study.stateSince} /></Cell>
            </Row>
          );
        })}
      </tbody>
    </Table>
  );
}
