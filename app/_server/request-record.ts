import 'server-only';
import type { AsyncLocalStorage } from 'node:async_hooks';
import { randomUUID } from 'node:crypto';
import type { ErrorCode } from '@/lib/errors';

/** What the server's start hook (docker/request-record.mjs) tells of each request; the rest is filled in while it is answered. */
export interface RequestRecord {
  id: string;
  method: string;
  path: string;
  received: number;
  sent: number;
  status: number;
  milliseconds: number;
  /** The caller went, or the process ended, before the answer was whole. */
  isCut: boolean;
  route?: string;
  organisationId?: string;
  userId?: string;
  tokenId?: string;
  error?: ErrorCode;
}

const held = globalThis as typeof globalThis & { fourfoldRequest?: AsyncLocalStorage<RequestRecord>; fourfoldDraining?: AbortSignal };
const never = new AbortController().signal;

/** The record of the request that is being answered; where the hook is not loaded, as in development, one that nobody reads. */
export function currentRequest(): RequestRecord {
  return held.fourfoldRequest?.getStore()
    ?? { id: randomUUID(), method: '', path: '', received: 0, sent: 0, status: 0, milliseconds: 0, isCut: false };
}

/** Aborted once this process has been told to end. */
export function drainSignal(): AbortSignal {
  return held.fourfoldDraining ?? never;
}
