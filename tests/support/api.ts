import supertest from 'supertest';
import type { ContractShape, PathParameters, ResponseOf } from '@/lib/domain/api/contract';
import { checkAgainstDocument } from './document-check';
import { need } from './environment';

/** Who calls: a session by its cookie, a script by its token, or nobody. */
export type Who = { cookie: string; organisation?: string } | { token: string } | null;

/** What is sent; a body of bytes goes as it is, anything else as JSON. */
export interface Sent {
  params?: Record<string, string>;
  query?: Record<string, string | number>;
  body?: unknown;
  headers?: Record<string, string>;
}

export type SentTo<C extends ContractShape> = Omit<Sent, 'params'> & (keyof PathParameters<C['path']> extends never ? unknown : { params: PathParameters<C['path']> });

export interface Problem { type: string; title: string; status: number; detail: string; errors: { path: string; message: string }[] }

export function addressOf(contract: ContractShape, { params = {}, query = {} }: Sent, who: Who): string {
  const path = contract.path.replace(/\{(\w+)\}/g, (_all, name: string) => encodeURIComponent(params[name] ?? ''));
  const search = new URLSearchParams(Object.entries(query).map(([name, value]) => [name, String(value)]));
  if (who && 'cookie' in who && who.organisation) search.set('organisation', who.organisation);
  return `/api/v1${path}${search.size > 0 ? `?${search.toString()}` : ''}`;
}

export function headersOf(contract: ContractShape, who: Who): Record<string, string> {
  if (!who) return {};
  if ('token' in who) return { authorization: `Bearer ${who.token}` };
  return { cookie: who.cookie, ...(contract.method === 'GET' ? {} : { origin: new URL(need('WEB_URL')).origin }) };
}

/** Sends one call and checks the answer against the OpenAPI document, whatever it is. */
export async function send<C extends ContractShape>(who: Who, contract: C, sent: Sent): Promise<supertest.Response> {
  const method = contract.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
  let call = supertest(need('WEB_URL'))[method](addressOf(contract, sent, who)).set({ ...headersOf(contract, who), ...sent.headers });
  if (sent.body !== undefined) call = call.send(sent.body as object | string);
  const response = await call;
  await checkAgainstDocument(contract, response.status, response.type, response.type.endsWith('json') ? response.body : response.text);
  return response;
}

/** The answer of a call that must succeed. */
export async function ok<C extends ContractShape>(who: Who, contract: C, sent: SentTo<C>): Promise<ResponseOf<C>> {
  const response = await send(who, contract, sent);
  if (response.status !== contract.status) throw new Error(`${contract.method} ${contract.path} answered ${response.status}: ${response.text}`);
  return response.body as ResponseOf<C>;
}

/** The problem of a call that must be refused. */
export async function refused<C extends ContractShape>(who: Who, contract: C, sent: SentTo<C>): Promise<Problem> {
  const response = await send(who, contract, sent);
  if (response.status < 400) throw new Error(`${contract.method} ${contract.path} answered ${response.status} and should have refused.`);
  const problem = response.body as Problem;
  if (problem.status !== response.status) throw new Error(`The problem says ${problem.status}, the answer ${response.status}.`);
  return problem;
}

/** If-Match with a revision. */
export function ifMatch(revision: number): { headers: Record<string, string> } {
  return { headers: { 'if-match': `"${revision}"` } };
}
