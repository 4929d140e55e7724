'use client';

import { useQuery } from '@tanstack/react-query';
import type { ContractShape, ResponseOf } from '@/lib/domain/api/contract';
import { apiKey, type ApiTarget } from './api-key';
import { callApi } from './call-api';

/** The answer of a reading call, kept and refreshed. */
export function useApi<C extends ContractShape>(contract: C, target: ApiTarget<C>, options: { enabled?: boolean } = {}) {
  return useQuery({
    queryKey: apiKey(contract, target),
    queryFn: ({ signal }): Promise<ResponseOf<C>> => callApi(contract, { ...target, signal }),
    ...options,
  });
}
