import { deleteIdempotencyKey, updateIdempotencyKey } from '@/db/queries/idempotency-keys';
import type { MemberContext } from '../context';
import { withOrganisation } from '../with-organisation';
import { claimKey, keyAt, type Answer, type KeyedRequest } from './keyed-request';

/**
 * As `answerOnce`, for work that waits for storage, during which no transaction may be held. One cut off between work and
 * answer is carried out again under the same key, so that must do no harm.
 */
export async function answerInSteps(ctx: MemberContext, request: KeyedRequest, work: (ctx: MemberContext) => Promise<Answer>): Promise<Answer> {
  const at = keyAt(ctx, request);
  const kept = await withOrganisation(ctx, (trx) => claimKey(ctx, trx, request));
  if (kept) return kept;
  try {
    const answer = await work(ctx);
    await withOrganisation(ctx, (trx) => updateIdempotencyKey(trx, at, answer.status, answer.body));
    return answer;
  } catch (error) {
    // Where that fails too the claim ends by itself.
    await withOrganisation(ctx, (trx) => deleteIdempotencyKey(trx, at))
      .catch((fault: unknown) => ctx.log.warn({ fault: fault instanceof Error ? fault.message : 'unknown' }, 'key not freed'));
    throw error;
  }
}
