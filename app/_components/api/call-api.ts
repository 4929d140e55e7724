import type { BodyOf, ContractShape, PathParameters, QueryOf, ResponseOf } from '@/lib/domain/api/contract';
import { noteRefusal } from '../standing/access-watch';
import { noteTrouble } from '../standing/service-watch';
import { signedInAgain } from '../standing/session-gate';
import { ApiProblem } from './api-problem';

interface CallOptions<C extends ContractShape> {
  /** Slug of the organisation, on calls that belong to one. */
  organisation?: string;
  params?: PathParameters<C['path']>;
  query?: QueryOf<C>;
  body?: BodyOf<C>;
  /** The revision that was read, on conditional writes. */
  revision?: number;
  /** The same key and body get the same answer, also where the first was lost. */
  idempotencyKey?: string;
  signal?: AbortSignal;
}

/** The address of a call with its parameters filled in. */
export function apiAddress<C extends ContractShape>(contract: C, options: CallOptions<C>): string {
  const params = (options.params ?? {}) as Record<string, string>;
  const path = contract.path.replace(/\{(\w+)\}/g, (_, name: string) => encodeURIComponent(params[name] ?? ''));
  const search = new URLSearchParams();
  if (options.organisation) search.set('organisation', options.organisation);
  for (const [name, value] of Object.entries(options.query ?? {})) if (typeof value === 'string' || typeof value === 'number') search.set(name, String(value));
  const text = search.toString();
  return `/api/v1${path}${text === '' ? '' : `?${text}`}`;
}

async function answerTo<C extends ContractShape>(contract: C, options: CallOptions<C>): Promise<Response> {
  const headers: Record<string, string> = { accept: 'application/json' };
  if (options.body !== undefined) headers['content-type'] = 'application/json';
  if (options.revision !== undefined) headers['if-match'] = `"${options.revision}"`;
  if (options.idempotencyKey !== undefined) headers['idempotency-key'] = options.idempotencyKey;
  try {
    return await fetch(apiAddress(contract, options), {
      method: contract.method, headers, signal: options.signal,
      body: options.body === undefined ? undefined : JSON.stringify(options.body),
    });
  } catch (error) {
    if (error instanceof TypeError) noteTrouble();
    throw error;
  }
}

/**
 * Calls the API from the browser; throws `ApiProblem` with what the server said. Where the session has ended the call waits
 * until the same person is signed in again, and is then made once more.
 */
export async function callApi<C extends ContractShape>(contract: C, options: CallOptions<C>): Promise<ResponseOf<C>> {
  let response = await answerTo(contract, options);
  let problem = response.ok ? null : await ApiProblem.from(response);
  if (problem?.code === 'not-signed-in' && (await signedInAgain(contract.method !== 'GET', options.signal))) {
    response = await answerTo(contract, options);
    problem = response.ok ? null : await ApiProblem.from(response);
  }
  if (problem) {
    if (problem.problem.status === 503) noteTrouble();
    noteRefusal(problem.problem.status, contract.access);
    throw problem;
  }
  return (response.status === 204 ? undefined : await response.json()) as ResponseOf<C>;
}
