import {
  claimIdempotencyKey, deleteIdempotencyKey, getIdempotencyKey, updateIdempotencyKey,
} from '@/db/queries/idempotency-keys';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { withOrganisation } from '../with-organisation';

interface Answer { status: number; body: unknown }

const keptMilliseconds = 24 * 3600 * 1000;
/** A claim this old without an answer belongs to a process that died. */
const claimMilliseconds = 60 * 1000;

/** The same key and request get the same answer for a day; a request that failed leaves the key free. */
export async function answerOnce(ctx: MemberContext, key: string, requestSha256: string, work: () => Promise<Answer>): Promise<Answer> {
  const at = { organisationId: ctx.organisation.id, actorId: ctx.token?.id ?? ctx.userId, key };
  const now = ctx.clock().getTime();

  const kept = await withOrganisation(ctx, async (trx) => {
    if (await claimIdempotencyKey(trx, at, requestSha256, new Date(now - keptMilliseconds))) return null;
    const present = await getIdempotencyKey(trx, at);
    if (!present) return null;
    if (present.request_sha256 !== requestSha256) {
      throw new AppError('key-reused', 'This Idempotency-Key came with another request before. Use a new key.');
    }
    if (present.status !== null) return { status: present.status, body: present.body };
    if (present.created_at.getTime() > now - claimMilliseconds) {
      throw new AppError('request-in-flight', 'The same request is still being answered. Ask again in a moment.');
    }
    return null;
  });
  if (kept) return kept;

  try {
    const answer = await work();
    await withOrganisation(ctx, (trx) => updateIdempotencyKey(trx, at, answer.status, answer.body));
    return answer;
  } catch (error) {
    await withOrganisation(ctx, (trx) => deleteIdempotencyKey(trx, at));
    throw error;
  }
}
