import type { ContractShape, PathParameters, QueryOf } from '@/lib/domain/api/contract';

/** Which answer of a call is meant. */
export interface ApiTarget<C extends ContractShape> {
  organisation?: string;
  params?: PathParameters<C['path']>;
  query?: QueryOf<C>;
}

/** The key an answer is kept under; without a target, the beginning of all keys of the call. */
export function apiKey<C extends ContractShape>(contract: C, target?: ApiTarget<C>): readonly unknown[] {
  const call = `${contract.method} ${contract.path}`;
  return target === undefined ? [call] : [call, target.organisation ?? null, target.params ?? {}, target.query ?? {}];
}
