import { findUserByEmail } from '@/db/queries/users';
import type { Me, SignInInput } from '@/lib/domain/people/schema';
import { AppError } from '@/lib/errors';
import type { Context } from '../context';
import { getMe } from './get-me';
import { passwordMatches } from './password';

/** Attempts are counted by account and address, and by address alone; the answer never tells whether the account exists. */
export async function signIn(ctx: Context, address: string, input: SignInInput): Promise<Me> {
  const accountKey = `${input.email} ${address}`;
  await ctx.limits.take('sign-in-address', address);
  await ctx.limits.take('sign-in-account', accountKey);
  const user = await findUserByEmail(ctx.db, input.email);
  if (!(await passwordMatches(user?.password_hash ?? null, input.password)) || !user) {
    throw new AppError('wrong-credentials', 'There is no account with this e-mail and password.');
  }
  await ctx.limits.clear('sign-in-account', accountKey);
  return getMe({ ...ctx, userId: user.id, email: user.email, token: null });
}
