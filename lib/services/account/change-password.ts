import { getUser } from '@/db/queries/users';
import type { ChangePasswordInput } from '@/lib/domain/people/account-schema';
import { AppError } from '@/lib/errors';
import type { UserContext } from '../context';
import { hashPassword, passwordMatches } from '../people/password';
import { requireSession } from '../require-session';
import { setPassword } from './set-password';

/** Changes the own password; this session goes on, the others end. */
export async function changePassword(ctx: UserContext, sessionId: string | null, input: ChangePasswordInput): Promise<void> {
  requireSession(ctx);
  await ctx.limits.take('sign-in-account', ctx.userId);
  const user = await getUser(ctx.db, ctx.userId);
  if (!(await passwordMatches(user.password_hash, input.password))) {
    const message = 'This is not the present password.';
    throw new AppError('wrong-password', message, { fields: [{ path: 'password', message }] });
  }
  await ctx.limits.clear('sign-in-account', ctx.userId);
  const passwordHash = await hashPassword(input.newPassword);
  await ctx.db.transaction().execute((trx) => setPassword(trx, { user, passwordHash, now: ctx.clock(), keptSessionId: sessionId }));
}
