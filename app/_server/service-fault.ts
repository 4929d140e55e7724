import 'server-only';
import { AppError } from '@/lib/errors';

type Service = 'database' | 'queue' | 'storage';
interface Fault { service: Service | null; isFull: boolean }

const names: Record<Service, string> = { database: 'The database', queue: 'Redis', storage: 'Storage for files' };
/** Connections that break, a server that shuts down or starts, no space, no memory, too many connections, a statement past its time. */
const databaseClasses = /^(08|53|57P|57014|58)/;
const databaseWords = /^(Connection terminated|Query read timeout|timeout exceeded when trying to connect|Client has encountered a connection error)/;
const networkCodes = new Set(['ECONNREFUSED', 'ECONNRESET', 'ETIMEDOUT', 'ENOTFOUND', 'EPIPE', 'EHOSTUNREACH', 'EAI_AGAIN']);

function ofDatabase(code: string, { message }: Error): Fault | null {
  if (!databaseClasses.test(code) && !databaseWords.test(message)) return null;
  return { service: 'database', isFull: code === '53100' };
}

function ofQueue({ name, message }: Error): Fault | null {
  if (!['MaxRetriesPerRequestError', 'ReplyError', 'AbortError'].includes(name) && message !== 'Command timed out' && !/^Connection is closed/.test(message)) return null;
  return { service: 'queue', isFull: message.startsWith('OOM ') };
}

function ofStorage(error: Error): Fault | null {
  const { $metadata } = error as Error & { $metadata?: { httpStatusCode?: number } };
  if ($metadata === undefined) return null;
  const status = $metadata.httpStatusCode;
  return status === undefined || status >= 500 ? { service: 'storage', isFull: status === 507 } : null;
}

function faultOf(error: unknown): Fault | null {
  if (!(error instanceof Error)) return null;
  const { code } = error as Error & { code?: unknown };
  const text = typeof code === 'string' ? code : '';
  return ofStorage(error) ?? ofDatabase(text, error) ?? ofQueue(error) ?? (networkCodes.has(text) ? { service: null, isFull: false } : null);
}

/** The answer where a service behind the product fails, null where the error is another one. */
export function serviceFault(error: unknown): AppError | null {
  const fault = faultOf(error);
  if (!fault) return null;
  const name = fault.service === null ? 'A service behind Fourfold' : names[fault.service];
  const retry = 'Try again in a moment; with an Idempotency-Key nothing is done twice.';
  if (fault.isFull) return new AppError('unavailable', `${name} has no space left. It must be given room by whoever runs it; what was confirmed is kept.`, { cause: error });
  return new AppError('unavailable', `${name} is not reachable. ${retry}`, { cause: error, retryAfter: 2 });
}
