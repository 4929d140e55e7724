import { randomUUID } from 'node:crypto';
import { setTimeout as pause } from 'node:timers/promises';
import type { ContractShape, ResponseOf } from '@/lib/domain/api/contract';
import { need } from '../environment';
import { addressOf, headersOf, type SentTo, type Who } from '../api';

const patience = 75_000;
const oneCall = 35_000;

/** Thrown for an answer that trying again will not change. */
export class Refused extends Error {
  constructor(readonly status: number, text: string) {
    super(`Answered ${status}: ${text}`);
  }
}

/** Tries until there is an answer that no fault on the way explains, at most a minute and a quarter. */
async function persist(what: string, attempt: () => Promise<Response>): Promise<Response> {
  const deadline = Date.now() + patience;
  for (let wait = 100; ; wait = Math.min(wait * 1.6, 1500)) {
    let heard: string;
    try {
      const response = await attempt();
      const isPassing = response.status >= 500 || response.status === 429 || response.status === 408;
      if (!isPassing) return response;
      heard = `${response.status} ${await response.text()}`;
    } catch (error) {
      const { cause } = error as { cause?: unknown };
      heard = `${String(error)} ${cause instanceof Error ? cause.message : ''}`;
    }
    if (Date.now() > deadline) throw new Error(`${what} got no answer in ${patience / 1000} s; the last was ${heard}`);
    await pause(wait);
  }
}

/** One call of the API as a careful script makes it: tried again under one Idempotency-Key until it is answered. */
export async function insist<C extends ContractShape>(who: Who, contract: C, sent: SentTo<C>): Promise<ResponseOf<C>> {
  const key = randomUUID();
  const address = `${need('WEB_URL')}${addressOf(contract, sent, who)}`;
  const raw = Buffer.isBuffer(sent.body);
  const headers = {
    ...headersOf(contract, who), ...(contract.method === 'POST' ? { 'idempotency-key': key } : {}),
    ...(sent.body === undefined ? {} : { 'content-type': raw ? 'application/octet-stream' : 'application/json' }),
  };
  const body = raw ? new Uint8Array(sent.body as Buffer) : sent.body === undefined ? undefined : JSON.stringify(sent.body);
  const deadline = Date.now() + patience;
  for (;;) {
    const response = await persist(`${contract.method} ${contract.path}`, () => fetch(address, { method: contract.method, headers, body, signal: AbortSignal.timeout(oneCall) }));
    const text = await response.text().catch(() => null);
    if (text === null) continue;
    if (response.status === contract.status) return (text === '' ? undefined : JSON.parse(text)) as ResponseOf<C>;
    if (!text.includes('request-in-flight') || Date.now() > deadline) throw new Refused(response.status, text);
    await pause(500);
  }
}

/** Sends bytes straight to storage; the ETag of what it keeps. */
export async function insistOnPart(url: string, bytes: Buffer): Promise<string> {
  const response = await persist('PUT of a part', () => fetch(url, { method: 'PUT', body: new Uint8Array(bytes), signal: AbortSignal.timeout(oneCall) }));
  if (response.status !== 200) throw new Refused(response.status, await response.text());
  return response.headers.get('etag') ?? '';
}
