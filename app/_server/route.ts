import 'server-only';
import { createHash } from 'node:crypto';
import type { ContractShape, ParsedBodyOf, ParsedQueryOf, PathParameters, ResponseOf } from '@/lib/domain/api/contract';
import { isStorable } from '@/lib/domain/api/storable-text';
import { AppError } from '@/lib/errors';
import type { Context, MemberContext, UserContext } from '@/lib/services/context';
import { answerInSteps } from '@/lib/services/idempotency/answer-in-steps';
import { answerOnce } from '@/lib/services/idempotency/answer-once';
import { clientAddress } from './client-address';
import { getServer } from './context';
import { enter, identify, type Caller } from './identify';
import { requireSameOrigin } from './origin';
import { problemResponse } from './problem-response';
import { invalid, readJson } from './read-body';
import { currentRequest } from './request-record';

type ContextOf<C extends ContractShape> = C['access'] extends 'public' ? Context : C['access'] extends 'signed-in' ? UserContext : MemberContext;

export interface Call<C extends ContractShape> {
  ctx: ContextOf<C>;
  params: PathParameters<C['path']>;
  query: ParsedQueryOf<C>;
  body: ParsedBodyOf<C>;
  /** The revision of `If-Match`; only on conditional writes, where it is always there. */
  ifMatch: number;
  request: Request;
  address: string;
  /** Headers of the answer. */
  headers: Headers;
}

type Handler<C extends ContractShape> = (call: Call<C>) => Promise<ResponseOf<C> | Response>;
/** Longer ones would not fit the index that finds them. */
const longestKey = 255;

/** Routes without a parameter are handed none. */
interface RouteArguments { params: Promise<Record<string, string | string[] | undefined> | undefined> }

function readIfMatch(contract: ContractShape, request: Request): number {
  if (!contract.conditional) return 0;
  const header = request.headers.get('if-match');
  if (header === null) throw new AppError('revision-needed', 'Send If-Match with the revision you read, such as If-Match: "3".');
  const revision = /^(?:W\/)?"(\d{1,9})"$/.exec(header)?.[1];
  if (!revision) throw new AppError('bad-request', `If-Match is ${header}. Expected a revision in quotes, such as "3".`);
  return Number(revision);
}

/** What no text can keep names nothing, and would be a fault of the database. */
function requireStorable(texts: Iterable<unknown>): void {
  for (const text of texts) {
    if (typeof text === 'string' && !isStorable(text)) throw new AppError('bad-request', 'The address holds a character that no text can keep.');
  }
}

function readQuery(contract: ContractShape, url: URL): unknown {
  const given: Record<string, string> = {};
  for (const [name, value] of url.searchParams) if (name !== 'organisation') given[name] = value;
  if (!contract.query) return given;
  const parsed = contract.query.safeParse(given);
  if (!parsed.success) throw invalid(parsed.error);
  return parsed.data;
}

async function contextOf(contract: ContractShape, caller: Caller | null, url: URL): Promise<Context | UserContext | MemberContext> {
  if (contract.access === 'public') return getServer().context;
  if (!caller) throw new AppError('not-signed-in', 'Sign in, or send a token.');
  return contract.access === 'signed-in' ? caller.user : enter(caller, url.searchParams.get('organisation'));
}

/** The context of the call, and in the record of the request whose it is. */
async function contextFor(contract: ContractShape, caller: Caller | null, url: URL): Promise<Context | UserContext | MemberContext> {
  const record = currentRequest();
  if (caller?.user.token) record.tokenId = caller.user.token.id;
  else record.userId = caller?.user.userId;
  const ctx = { ...await contextOf(contract, caller, url), requestId: record.id };
  if ('organisation' in ctx) record.organisationId = ctx.organisation.id;
  return ctx;
}

function toResponse(status: number, body: unknown, headers: Headers): Response {
  if (status === 204 || body === undefined) return new Response(null, { status, headers });
  headers.set('content-type', 'application/json');
  if (typeof body === 'object' && body !== null && 'revision' in body) headers.set('etag', `"${String(body.revision)}"`);
  return new Response(JSON.stringify(body), { status, headers });
}

async function answer<C extends ContractShape>(contract: C, handler: Handler<C>, request: Request, route: RouteArguments): Promise<Response> {
  const { env, requests } = getServer();
  const url = new URL(request.url);
  const headers = new Headers({ 'cache-control': 'no-store' });
  const hasCookie = request.headers.has('cookie') && !request.headers.has('authorization');
  if (contract.method !== 'GET') requireSameOrigin(request, env.PUBLIC_URL, hasCookie);

  const caller = contract.access === 'public' ? null : await identify(request.headers);
  if (caller) await requests.count(caller.user.token ? { kind: 'token', id: caller.user.token.id } : { kind: 'person', id: caller.user.userId });
  const ctx = await contextFor(contract, caller, url);
  const params = (await route.params) ?? {};
  requireStorable([...Object.values(params), ...url.searchParams.values()]);
  const ifMatch = readIfMatch(contract, request);
  const query = readQuery(contract, url);

  let text = '';
  let body: unknown;
  if (contract.body) {
    const read = await readJson(request, env.BODY_SECONDS);
    const parsed = contract.body.safeParse(read.value);
    if (!parsed.success) throw invalid(parsed.error);
    ({ text } = read);
    body = parsed.data;
  }

  const call = {
    ctx, params, query, body, ifMatch, request, headers, address: clientAddress(request, env.TRUSTED_PROXIES),
  } as unknown as Call<C>;
  const key = request.headers.get('idempotency-key');
  if (key === null || contract.method !== 'POST' || contract.access !== 'organisation' || contract.secret) {
    const result = await handler(call);
    return result instanceof Response ? result : toResponse(contract.status, result, headers);
  }
  if (key.length > longestKey) throw new AppError('bad-request', `The Idempotency-Key has ${key.length} characters. Expected at most ${longestKey}.`);
  const requestSha256 = createHash('sha256').update(`${contract.method} ${url.pathname}\n${text}`).digest('hex');
  const answered = contract.inSteps ? answerInSteps : answerOnce;
  const kept = await answered(ctx as MemberContext, { key, requestSha256 }, async (ctx) => {
    const result = await handler({ ...call, ctx: ctx });
    if (result instanceof Response) throw new Error(`${contract.path} answers with a stream and cannot be kept.`);
    return { status: contract.status, body: result };
  });
  return toResponse(kept.status, kept.body, headers);
}

/** A route handler of a contract: session or token, organisation, origin, schemas, idempotency, and errors as problems. */
export function route<C extends ContractShape>(contract: C, handler: Handler<C>) {
  return async (request: Request, routeArguments: RouteArguments): Promise<Response> => {
    currentRequest().route = contract.path;
    try {
      return await answer(contract, handler, request, routeArguments);
    } catch (error) {
      return problemResponse(error, getServer().context.log);
    }
  };
}
