'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import type { ContractShape, ResponseOf } from '@/lib/domain/api/contract';
import { apiKey, type ApiTarget } from './api-key';
import { callApi } from './call-api';

interface ApiOptions<Answer> {
  enabled?: boolean;
  /** Milliseconds until it is read again, while the answer says that something is under way. */
  refetchEvery?: (answer: Answer) => number | false;
  /** While another target is read, the answer before stays. */
  keepsAnswer?: boolean;
}

/** The answer of a reading call, kept and refreshed. */
export function useApi<C extends ContractShape>(contract: C, target: ApiTarget<C>, options: ApiOptions<ResponseOf<C>> = {}) {
  const { enabled, refetchEvery = () => false, keepsAnswer } = options;
  return useQuery({
    queryKey: apiKey(contract, target),
    queryFn: ({ signal }): Promise<ResponseOf<C>> => callApi(contract, { ...target, signal }),
    enabled,
    placeholderData: keepsAnswer ? keepPreviousData : undefined,
    refetchInterval: ({ state }) => (state.data === undefined ? false : refetchEvery(state.data)),
  });
}
