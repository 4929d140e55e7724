import { createHash } from 'node:crypto';
import { findApiTokenBySecret, touchApiToken } from '@/db/queries/api-tokens';
import { listMembershipsOfUser } from '@/db/queries/memberships';
import { getUser } from '@/db/queries/users';
import { roleSchema } from '@/lib/domain/people/roles';
import { tokenScopeSchema } from '@/lib/domain/tokens/scopes';
import { AppError } from '@/lib/errors';
import type { Context, MemberContext } from '../context';
import { withOrganisation } from '../with-organisation';

/** The token's owner in the token's organisation, with the roles they have now; 401 where it is unknown or has ended. */
export async function identifyToken(ctx: Context, secret: string): Promise<MemberContext> {
  const token = await findApiTokenBySecret(ctx.db, createHash('sha256').update(secret).digest());
  const now = ctx.clock();
  if (!token) throw new AppError('not-signed-in', 'The token is not known. It may have been withdrawn.');
  if (token.expires_at && token.expires_at <= now) throw new AppError('not-signed-in', `The token “${token.name}” has expired.`);

  const user = await getUser(ctx.db, token.user_id);
  const membership = await withOrganisation({ db: ctx.db, organisation: { id: token.organisation_id } }, async (trx) => {
    await touchApiToken(trx, token.organisation_id, token.id, now);
    const memberships = await listMembershipsOfUser(trx, token.user_id);
    return memberships.find((row) => row.id === token.organisation_id);
  });
  if (!membership) throw new AppError('not-signed-in', 'The owner of the token is no longer a member.');

  return {
    ...ctx,
    userId: user.id,
    email: user.email,
    token: { id: token.id, name: token.name, scopes: tokenScopeSchema.array().parse(token.scopes), codeId: token.code_id },
    organisation: { id: membership.id, slug: membership.slug, name: membership.name },
    roles: roleSchema.array().parse(membership.roles),
  };
}
