import { insertPasswordReset } from '@/db/queries/password-resets';
import { findUserByEmail } from '@/db/queries/users';
import type { Context } from '../context';
import { newId } from '../keys';
import { queueMail } from '../mail/queue-mail';
import { withUser } from '../with-organisation';

/** Every answer takes this long, so that its time does not tell which addresses have an account. */
const answerAfterMilliseconds = 200;
const hourMilliseconds = 3600_000;

/** Sends a link that sets a new password where there is such an account; the answer is the same where there is none. */
export async function requestReset(ctx: Context, address: string, { email }: { email: string }): Promise<{ email: string }> {
  await ctx.limits.take('reset-address', address);
  await ctx.limits.take('reset-account', email);
  const answered = new Promise((resolve) => setTimeout(resolve, answerAfterMilliseconds));
  const user = await findUserByEmail(ctx.db, email);
  if (user) {
    await withUser(ctx, user.id, async (trx) => {
      const id = newId();
      await insertPasswordReset(trx, { id, user_id: user.id, expires_at: new Date(ctx.clock().getTime() + hourMilliseconds) });
      await queueMail(trx, { organisationId: null, userId: user.id, address: email, subjectId: id, facts: { kind: 'password-reset' } });
    });
  }
  await answered;
  return { email };
}
