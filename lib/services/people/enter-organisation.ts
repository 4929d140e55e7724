import { listMembershipsOfUser } from '@/db/queries/memberships';
import { roleSchema } from '@/lib/domain/people/roles';
import { AppError } from '@/lib/errors';
import type { MemberContext, UserContext } from '../context';
import { withUser } from '../with-organisation';

/** The organisation named by its slug, or the only one; 404 where the caller does not belong, as if it did not exist. */
export async function enterOrganisation(ctx: UserContext, slug: string | null): Promise<MemberContext> {
  const memberships = await withUser(ctx, ctx.userId, (trx) => listMembershipsOfUser(trx, ctx.userId));
  if (slug === null && memberships.length > 1) {
    const slugs = memberships.map((row) => row.slug).join(', ');
    throw new AppError('organisation-needed', `You belong to several organisations. Add ?organisation= with one of ${slugs}.`);
  }
  const membership = slug === null ? memberships[0] : memberships.find((row) => row.slug === slug);
  if (!membership) throw new AppError('not-found', 'There is no such organisation, or you do not belong to it.');
  return {
    ...ctx,
    organisation: { id: membership.id, slug: membership.slug, name: membership.name },
    roles: roleSchema.array().parse(membership.roles),
  };
}
