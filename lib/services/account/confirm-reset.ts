import { lockPasswordReset } from '@/db/queries/password-resets';
import { getUser } from '@/db/queries/users';
import type { ConfirmResetInput } from '@/lib/domain/people/account-schema';
import { AppError } from '@/lib/errors';
import type { Context } from '../context';
import { hashPassword } from '../people/password';
import { sha256Of } from '../secret-token';
import { setPassword } from './set-password';

/** Sets a new password by the link of a mail: for an hour, once. */
export async function confirmReset(ctx: Context, address: string, { token, password }: ConfirmResetInput): Promise<void> {
  await ctx.limits.take('link', address);
  const passwordHash = await hashPassword(password);
  await ctx.db.transaction().execute(async (trx) => {
    const now = ctx.clock();
    const reset = await lockPasswordReset(trx, sha256Of(token));
    if (!reset) throw new AppError('not-found', 'This link is not known. A newer mail may have replaced it: open the newest, or ask for another.');
    if (reset.used_at) throw new AppError('wrong-state', 'This link has served already, or the password was changed since. Sign in, or ask for another link.');
    if (reset.expires_at <= now) throw new AppError('wrong-state', 'This link has expired; it holds for one hour. Ask for another.');
    await setPassword(trx, { user: await getUser(trx, reset.user_id), passwordHash, now, keptSessionId: null });
  });
}
