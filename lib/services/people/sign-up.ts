import { insertMembership } from '@/db/queries/memberships';
import { insertUser } from '@/db/queries/users';
import type { Me, SignUpInput } from '@/lib/domain/people/schema';
import type { Context } from '../context';
import { newId } from '../keys';
import { refuseDuplicate } from '../unique-violation';
import { withOrganisation } from '../with-organisation';
import { createOrganisation } from './create-organisation';
import { getMe } from './get-me';
import { hashPassword } from './password';

/** An account and an organisation of its own, of which it is owner and engineer. */
export async function signUp(ctx: Context, address: string, input: SignUpInput): Promise<Me> {
  await ctx.limits.take('sign-up', address);
  const { email } = input;
  const [userId, organisationId] = [newId(), newId()];
  const passwordHash = await hashPassword(input.password);
  const detail = `There is an account for ${email} already. Sign in, or use another address.`;
  await refuseDuplicate('users_email_key', 'email', detail, () =>
    withOrganisation({ db: ctx.db, organisation: { id: organisationId } }, async (trx) => {
      await insertUser(trx, { id: userId, email, password_hash: passwordHash });
      await createOrganisation(trx, organisationId, input.organisation);
      await insertMembership(trx, { organisation_id: organisationId, user_id: userId, roles: ['owner', 'engineer'] });
    }),
  );
  return getMe({ ...ctx, userId, email, token: null });
}
