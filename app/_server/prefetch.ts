import 'server-only';
import { dehydrate, QueryClient, type DehydratedState } from '@tanstack/react-query';
import { apiKey, type ApiTarget } from '@/app/_components/api/api-key';
import type { ContractShape, ResponseOf } from '@/lib/domain/api/contract';
import { orNotFound } from './visit';

interface Answer { key: readonly unknown[]; data: Promise<unknown> }

/** What the browser would be answered on this call, made by the same service. */
export function answerOf<C extends ContractShape>(contract: C, target: ApiTarget<C>, service: Promise<ResponseOf<C>>): Answer {
  return { key: apiKey(contract, target), data: service };
}

/** Answers that the first paint of a page already has. */
export async function prefetch(...answers: Answer[]): Promise<DehydratedState> {
  const client = new QueryClient();
  const found = await Promise.all(answers.map((answer) => orNotFound(answer.data)));
  answers.forEach((answer, index) => client.setQueryData(answer.key, found[index]));
  return dehydrate(client);
}
