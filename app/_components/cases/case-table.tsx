'use client';

import type { Case } from '@/lib/domain/cases/schema';
import { useOrganisation } from '../organisation/organisation-context';
import { Cell, HeadCell, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { NameLink } from '../ui/text-link';
import { DeclaredText } from './declared-text';

interface CaseTableProps { cases: readonly Case[]; withoutCode?: boolean }

export function CaseTable({ cases, withoutCode }: CaseTableProps) {
  const { slug } = useOrganisation();
  return (
    <Table caption="Cases." hideCaption>
      <Head>
        <tr>
          <HeadCell>Name</HeadCell><HeadCell>Kind</HeadCell>{!withoutCode && <HeadCell>Code</HeadCell>}
          <HeadCell>Problem</HeadCell><HeadCell>Declared</HeadCell><HeadCell num>Grids</HeadCell><HeadCell num>Revision</HeadCell>
        </tr>
      </Head>
      <tbody>
        {cases.map((item) => (
          <Row key={item.id} isLinked>
            <RowHead className="min-w-40"><NameLink href={`/${slug}/cases/${item.slug}`}>{item.name}</NameLink></RowHead>
            <Cell>{item.kind}</Cell>
            {!withoutCode && <Cell><NameLink href={`/${slug}/codes/${item.code.slug}`}>{item.code.name}</NameLink></Cell>}
            <Cell className="min-w-32"><NameLink href={`/${slug}/problems/${item.problem.slug}`}>{item.problem.name}</NameLink></Cell>
            <Cell className="min-w-32"><DeclaredText definition={item} /></Cell>
            <Cell num>{item.gridPlan.length}</Cell>
            <Cell num>{item.revision}</Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
