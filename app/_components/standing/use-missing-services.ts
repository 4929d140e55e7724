'use client';

import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { readyContract } from '@/lib/domain/api/service-schema';
import { callApi } from '../api/call-api';
import { useStore } from './create-store';
import { serviceTrouble } from './service-watch';
import { missingOf, type Missing } from './services-words';

const askAgainMilliseconds = 4000;

/** Once something was not reachable: what is not, until all of it is, and what could not be read is then read again. */
export function useMissingServices(): { missing: readonly Missing[]; askAgain: () => void } {
  const isInTrouble = useStore(serviceTrouble, false);
  const queries = useQueryClient();
  const ready = useQuery({
    queryKey: ['ready'], enabled: isInTrouble, staleTime: 0, gcTime: 0, retry: false, refetchInterval: askAgainMilliseconds,
    queryFn: ({ signal }): Promise<readonly Missing[]> => callApi(readyContract, { signal }).then(() => [], missingOf),
  });
  const isBack = isInTrouble && ready.data?.length === 0;
  useEffect(() => {
    if (!isBack) return;
    serviceTrouble.set(false);
    queries.removeQueries({ queryKey: ['ready'] });
    void queries.refetchQueries({ predicate: (query) => query.state.status === 'error' });
  }, [isBack, queries]);
  return { missing: isInTrouble ? (ready.data ?? []) : [], askAgain: () => void ready.refetch() };
}
