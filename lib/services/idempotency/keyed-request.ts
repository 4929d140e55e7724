import { claimIdempotencyKey, getIdempotencyKey, type IdempotencyKeyAt } from '@/db/queries/idempotency-keys';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import type { Trx } from '../with-organisation';

export interface KeyedRequest { key: string; requestSha256: string }
export interface Answer { status: number; body: unknown }

const keptMilliseconds = 24 * 3600 * 1000;
/** A claim this old without an answer belongs to a process that died. */
const claimMilliseconds = 15 * 1000;

export function keyAt(ctx: MemberContext, { key }: KeyedRequest): IdempotencyKeyAt {
  return { organisationId: ctx.organisation.id, actorId: ctx.token?.id ?? ctx.userId, key };
}

/** Claims the key, or finds the answer that was given under it; refused where it came with another request. */
export async function claimKey(ctx: MemberContext, trx: Trx, request: KeyedRequest): Promise<Answer | null> {
  const at = keyAt(ctx, request);
  const now = ctx.clock().getTime();
  if (await claimIdempotencyKey(trx, at, request.requestSha256, new Date(now - keptMilliseconds))) return null;
  const present = await getIdempotencyKey(trx, at);
  if (!present) return null;
  if (present.request_sha256 !== request.requestSha256) {
    throw new AppError('key-reused', 'This Idempotency-Key came with another request before. Use a new key.');
  }
  if (present.status !== null) return { status: present.status, body: present.body };
  if (present.created_at.getTime() > now - claimMilliseconds) {
    throw new AppError('request-in-flight', 'The same request is still being answered. Ask again in a moment.');
  }
  return null;
}
