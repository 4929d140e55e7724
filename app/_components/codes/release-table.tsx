'use client';

import { useMutation, useQueryClient } from '@tanstack/react-query';
import { getMatrixContract } from '@/lib/domain/matrix/schema';
import { listReleasesContract, releaseStateSchema, updateReleaseContract, type Release, type ReleaseState } from '@/lib/domain/codes/schema';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { problemOf } from '../api/problem-of';
import { ProblemNotice } from '../forms/problem-notice';
import { useOrganisation } from '../organisation/organisation-context';
import { Cell, HeadCell, Missing, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { DateTime } from '../ui/date-time';

interface ReleaseTableProps { code: string; releases: readonly Release[]; mayChange: boolean }

export function ReleaseTable({ code, releases, mayChange }: ReleaseTableProps) {
  const { slug } = useOrganisation();
  const queries = useQueryClient();
  const change = useMutation({
    mutationFn: ({ release, state }: { release: Release; state: ReleaseState }) =>
      callApi(updateReleaseContract, { organisation: slug, params: { code, version: release.version }, revision: release.revision, body: { state } }),
    onSettled: () => Promise.all([
      queries.invalidateQueries({ queryKey: apiKey(listReleasesContract) }),
      queries.invalidateQueries({ queryKey: apiKey(getMatrixContract) }),
    ]),
  });
  return (
    <>
      <Table caption="Releases, newest first." hideCaption>
        <Head><tr><HeadCell>Version</HeadCell><HeadCell>State</HeadCell><HeadCell>Commit</HeadCell><HeadCell>Made</HeadCell></tr></Head>
        <tbody>
          {releases.map((release) => (
            <Row key={release.id}>
              <RowHead>{release.version}</RowHead>
              <Cell>
                {mayChange ? (
                  <select
                    aria-label={`State of ${release.version}`}
                    value={change.isPending && change.variables.release.id === release.id ? change.variables.state : release.state}
                    disabled={change.isPending}
                    onChange={(event) => change.mutate({ release, state: releaseStateSchema.parse(event.target.value) })}
                    className="-ml-1 min-h-11 cursor-pointer bg-transparent underline decoration-rule/60 decoration-1 underline-offset-3 tablet:min-h-6"
                  >
                    {releaseStateSchema.options.map((state) => <option key={state} value={state} className="bg-paper">{state}</option>)}
                  </select>
                ) : release.state}
              </Cell>
              <Cell>{release.commit === null ? <Missing reason="No commit stated" /> : <code className="font-mono text-code break-all">{release.commit}</code>}</Cell>
              <Cell><DateTime value={release.createdAt} /></Cell>
            </Row>
          ))}
        </tbody>
      </Table>
      <ProblemNotice problem={problemOf(change.error, 'Not changed')} />
    </>
  );
}
