import type { InvitationRow } from '@/db/queries/invitations';
import { findUserByEmail } from '@/db/queries/users';
import { passwordSchema } from '@/lib/domain/people/schema';
import { AppError } from '@/lib/errors';
import type { Context } from '../context';
import { newId } from '../keys';
import { hashPassword, passwordMatches } from '../people/password';

export interface Guest { userId: string; newPasswordHash: string | null }

interface Claim { address: string; signedIn: { userId: string; email: string } | null; password: string | undefined }

function passwordNeeded(message: string): AppError {
  return new AppError('invalid', message, { fields: [{ path: 'password', message }] });
}

/** Who accepts: an invitation is for its address, not for whoever holds the link. */
export async function guestOf(ctx: Context, { email }: InvitationRow, { address, signedIn, password }: Claim): Promise<Guest> {
  if (signedIn) {
    if (signedIn.email === email) return { userId: signedIn.userId, newPasswordHash: null };
    throw new AppError('wrong-state', `You are signed in as ${signedIn.email}; the invitation is for ${email}. Sign out, then open the link again.`);
  }
  const user = await findUserByEmail(ctx.db, email);
  if (!user) {
    const chosen = passwordSchema.safeParse(password);
    if (!chosen.success) throw passwordNeeded('Choose a password of at least 10 characters.');
    return { userId: newId(), newPasswordHash: await hashPassword(chosen.data) };
  }
  if (password === undefined) throw passwordNeeded(`There is an account for ${email}. Type its password, or sign in first.`);
  await ctx.limits.take('sign-in-account', `${email} ${address}`);
  if (!(await passwordMatches(user.password_hash, password))) throw new AppError('wrong-credentials', `This is not the password of ${email}.`);
  await ctx.limits.clear('sign-in-account', `${email} ${address}`);
  return { userId: user.id, newPasswordHash: null };
}
