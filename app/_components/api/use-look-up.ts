'use client';

import { useQuery } from '@tanstack/react-query';
import type { BodyOf, ContractShape, ResponseOf } from '@/lib/domain/api/contract';
import { callApi } from './call-api';

/** The answer of a call that reads, though its question is a secret and so travels in a body; null asks nothing. */
export function useLookUp<C extends ContractShape>(contract: C, body: BodyOf<C> | null) {
  return useQuery({
    queryKey: [contract.path, body],
    queryFn: ({ signal }): Promise<ResponseOf<C>> => {
      if (body === null) throw new Error('Nothing was asked.');
      return callApi(contract, { body, signal });
    },
    enabled: body !== null,
    staleTime: Infinity,
  });
}
