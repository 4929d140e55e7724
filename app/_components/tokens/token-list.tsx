'use client';

import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { deleteTokenContract, listTokensContract, type Token } from '@/lib/domain/tokens/schema';
import { Answered } from '../api/answered';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { problemOf } from '../api/problem-of';
import { useApi } from '../api/use-api';
import { ProblemNotice } from '../forms/problem-notice';
import { PageLinks } from '../lists/page-links';
import { useOrganisation } from '../organisation/organisation-context';
import { Cell, HeadCell, Missing, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { Button } from '../ui/button';
import { DateTime } from '../ui/date-time';
import { EmptyState } from '../ui/empty-state';
import { TextButton } from '../ui/text-link';

function Ends({ token }: { token: Token }) {
  return token.expiresAt === null ? <span>never</span> : <DateTime value={token.expiresAt} />;
}

export function TokenList({ query }: { query: { limit: number; cursor?: string } }) {
  const { slug } = useOrganisation();
  const queries = useQueryClient();
  const tokens = useApi(listTokensContract, { organisation: slug, query });
  const [asked, setAsked] = useState<Token | null>(null);
  const withdraw = useMutation({
    mutationFn: (token: Token) => callApi(deleteTokenContract, { organisation: slug, params: { id: token.id } }),
    onSuccess: () => setAsked(null),
    onSettled: () => queries.invalidateQueries({ queryKey: apiKey(listTokensContract) }),
  });
  return (
    <Answered query={tokens}>
      {({ items, nextCursor }) => items.length === 0
        ? <EmptyState>The tokens you make belong here.</EmptyState>
        : (
          <>
            <Table caption="Your tokens." hideCaption>
              <Head><tr><HeadCell>Name</HeadCell><HeadCell>May</HeadCell><HeadCell>Code</HeadCell><HeadCell>Last used</HeadCell><HeadCell>Ends</HeadCell><HeadCell><span className="sr-only">Withdraw</span></HeadCell></tr></Head>
              <tbody>
                {items.map((token) => (
                  <Row key={token.id}>
                    <RowHead>{token.name}</RowHead>
                    <Cell>{token.scopes.join(', ')}</Cell>
                    <Cell>{token.code ?? 'every code'}</Cell>
                    <Cell>{token.lastUsedAt === null ? <Missing reason="Never used" /> : <DateTime value={token.lastUsedAt} show="both" />}</Cell>
                    <Cell><Ends token={token} /></Cell>
                    <Cell><TextButton aria-label={`Withdraw ${token.name}`} onClick={() => setAsked(token)}>Withdraw</TextButton></Cell>
                  </Row>
                ))}
              </tbody>
            </Table>
            <PageLinks nextCursor={nextCursor} />
            {asked && (
              <div role="alertdialog" aria-labelledby="withdraw-question" className="mt-4 border-b border-t-3 border-b-rule border-t-fail py-3">
                <p id="withdraw-question"><b>Withdraw {asked.name}?</b> What still uses it will be refused from now on. This cannot be taken back.</p>
                <div className="mt-3 flex flex-wrap gap-3">
                  <Button kind="binding" autoFocus disabled={withdraw.isPending} onClick={() => withdraw.mutate(asked)}>Withdraw token {asked.name}</Button>
                  <Button onClick={() => setAsked(null)}>Keep it</Button>
                </div>
              </div>
            )}
            <ProblemNotice problem={problemOf(withdraw.error, 'Not withdrawn')} />
          </>
        )}
    </Answered>
  );
}
