import { updateIdempotencyKey } from '@/db/queries/idempotency-keys';
import type { StudyEvents } from '@/lib/platform/study-events';
import type { MemberContext } from '../context';
import { withOrganisation } from '../with-organisation';
import { claimKey, keyAt, type Answer, type KeyedRequest } from './keyed-request';

/** Events told only when the transaction they tell of stands. */
function holdEvents(events: StudyEvents): { held: StudyEvents; tell: () => Promise<void> } {
  const messages: [string, string][] = [];
  return {
    held: {
      ...events,
      publish: (studyId, message) => {
        messages.push([studyId, message]);
        return Promise.resolve();
      },
    },
    tell: async () => {
      for (const [studyId, message] of messages) await events.publish(studyId, message);
    },
  };
}

/**
 * The same key and request get the same answer for a day. The work, its answer and the key are one transaction: whatever
 * dies, all three are kept or none, and a second call under the key waits for the first.
 */
export async function answerOnce(ctx: MemberContext, request: KeyedRequest, work: (ctx: MemberContext) => Promise<Answer>): Promise<Answer> {
  const { held, tell } = holdEvents(ctx.events);
  const answer = await withOrganisation(ctx, async (trx) => {
    const kept = await claimKey(ctx, trx, request);
    if (kept) return kept;
    const made = await work({ ...ctx, events: held, within: trx });
    await updateIdempotencyKey(trx, keyAt(ctx, request), made.status, made.body);
    return made;
  });
  // Pages read again by themselves: what is done is not undone because nobody could be told.
  await tell().catch((error: unknown) => ctx.log.warn({ fault: error instanceof Error ? error.message : 'unknown' }, 'event not told'));
  return answer;
}
