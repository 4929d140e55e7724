import 'server-only';
import { AppError } from '@/lib/errors';
import type { Logger } from '@/lib/platform/logger';
import { currentRequest } from './request-record';
import { serviceFault } from './service-fault';

function toAppError(error: unknown, log: Logger, requestId: string): AppError {
  if (error instanceof AppError) return error;
  log.error({ requestId, err: error }, 'request failed');
  return serviceFault(error) ?? new AppError('unexpected', `The fault is in Fourfold and has been logged as ${requestId}. Try again; if it stays, report that number.`);
}

/** An error as application/problem+json (RFC 9457); what nobody foresaw is logged and told without its inner message. */
export function problemResponse(error: unknown, log: Logger): Response {
  const record = currentRequest();
  const fault = toAppError(error, log, record.id);
  record.error = fault.code;
  const headers = new Headers({ 'content-type': 'application/problem+json', 'cache-control': 'no-store' });
  if (fault.retryAfter !== undefined) headers.set('retry-after', String(fault.retryAfter));
  if (fault.code === 'not-signed-in') headers.set('www-authenticate', 'Bearer');
  const body = { type: `/docs/problems#${fault.code}`, title: fault.title, status: fault.status, detail: fault.message, errors: fault.fields };
  return new Response(JSON.stringify(body), { status: fault.status, headers });
}
