'use client';

import { useRef } from 'react';
import type { CaseKind } from '@/lib/domain/cases/definition';
import type { Matrix } from '@/lib/domain/matrix/schema';
import { trendRange } from '@/lib/figures/trend-line';
import { useOrganisation } from '../organisation/organisation-context';
import { GroupRow } from '../tables/cells';
import { Head, Row } from '../tables/table';
import { NameLink } from '../ui/text-link';
import { CaseTrend } from './case-trend';
import { FormalOrder } from './formal-order';
import { MatrixCellView } from './matrix-cell';
import { MatrixFeet } from './matrix-feet';
import { ReadOut } from './read-out';
import { ReleaseHead } from './release-head';
import { useGridKeys } from './use-grid-keys';
import { useIsNarrow } from './use-is-narrow';

const groups: { kind: CaseKind; name: string }[] = [
  { kind: 'order', name: 'Order' }, { kind: 'exactness', name: 'Exactness' }, { kind: 'benchmark', name: 'Benchmark' }, { kind: 'solution', name: 'Solution' },
];

const caseColumn = 'sticky left-0 bg-paper pr-3 text-left align-middle font-normal max-tablet:w-[164px] max-tablet:min-w-[164px] group-hover:bg-wash';

/** Cases down, releases across; on a phone the newest release stands next to the case. */
export function MatrixTable({ matrix }: { matrix: Matrix }) {
  const isNarrow = useIsNarrow();
  return <MatrixGrid key={String(isNarrow)} matrix={matrix} isNarrow={isNarrow} />;
}

function MatrixGrid({ matrix, isNarrow }: { matrix: Matrix; isNarrow: boolean }) {
  const { slug } = useOrganisation();
  const table = useRef<HTMLTableElement>(null);
  const order = matrix.releases.map((_, index) => index);
  const columns = isNarrow ? order.toReversed() : order;
  const rows = groups.flatMap(({ kind }) => matrix.cases.filter((row) => row.kind === kind));
  const newest = matrix.releases.length - 1;
  const keys = useGridKeys(table, { rows: rows.length, columns: columns.length }, { row: 0, column: isNarrow ? 0 : newest });
  const { current } = keys;
  const readRow = rows[current.row];
  const readCell = readRow?.cells[columns[current.column] ?? 0];
  const errorsOf = (row: Matrix['cases'][number]) => matrix.releases.map(({ version }) => row.trend.find(({ release }) => release === version)?.error ?? null);
  const range = trendRange(rows.map(errorsOf));
  return (
    <figure>
      <div className="relative overflow-x-auto border-b-[1.5px] border-ink" role="group" aria-label="Table, scrolls sideways">
        <table ref={table} role="grid" aria-label={`Cases of ${matrix.code.name} by releases`} className="w-full border-collapse text-table">
          <Head>
            <tr>
              <th scope="col" className={`${caseColumn} z-1 border-t-[1.5px] border-ink pt-2 pb-1.5 align-bottom`}>Case</th>
              <th scope="col" className="border-t-[1.5px] border-ink pt-2 pr-2 pb-1.5 text-left align-bottom font-normal max-tablet:hidden">Formal order</th>
              {columns.map((index) => {
                const release = matrix.releases[index];
                return release && <ReleaseHead key={release.id} release={release} isNewest={index === newest} />;
              })}
              <th scope="col" className="border-t-[1.5px] border-ink pt-2 pb-1.5 pl-4 text-left align-bottom font-normal max-tablet:hidden">Error at equal grids</th>
            </tr>
          </Head>
          {groups.map(({ kind, name }) => {
            const own = rows.filter((row) => row.kind === kind);
            if (own.length === 0) return null;
            return (
              <tbody key={kind} className="border-b border-rule last:border-b-0">
                <GroupRow columns={columns.length + 3}>{name}</GroupRow>
                {own.map((row) => {
                  const at = rows.indexOf(row);
                  return (
                    <Row key={row.id} isLinked className="group">
                      <th scope="row" className={caseColumn}><NameLink href={`/${slug}/cases/${row.slug}`}>{row.name}</NameLink></th>
                      <td className="pr-2 align-middle text-graphite max-tablet:hidden"><FormalOrder row={row} /></td>
                      {columns.map((index, column) => {
                        const cell = row.cells[index];
                        if (!cell) return null;
                        const place = { row: at, column };
                        return (
                          <MatrixCellView
                            key={cell.release} row={row} cell={cell} place={`${at} ${column}`}
                            href={cell.study === null ? null : `/${slug}/studies/${cell.study}`}
                            isCurrent={at === current.row && column === current.column}
                            onRead={() => keys.setCurrent(place)} onKeyDown={keys.onKeyDown}
                          />
                        );
                      })}
                      <td className="pl-4 align-middle max-tablet:hidden"><CaseTrend row={row} errors={errorsOf(row)} range={range} /></td>
                    </Row>
                  );
                })}
              </tbody>
            );
          })}
          <MatrixFeet releases={columns.flatMap((index) => matrix.releases[index] ?? [])} caseColumn={caseColumn} />
        </table>
      </div>
      {readRow && readCell && <ReadOut row={readRow} cell={readCell} worse={matrix.worse} />}
    </figure>
  );
}
