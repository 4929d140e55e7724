import { findCode } from '@/db/queries/codes';
import { listMembershipsOfUser } from '@/db/queries/memberships';
import { roleSchema } from '@/lib/domain/people/roles';
import type { Me } from '@/lib/domain/people/schema';
import { keyOf } from '../keys';
import type { MemberContext, UserContext } from '../context';
import { withOrganisation, withUser } from '../with-organisation';

/** A session sees all its organisations, a token the one it belongs to. */
export async function getMe(ctx: UserContext | MemberContext): Promise<Me> {
  const person = { id: ctx.userId, email: ctx.email };
  if ('organisation' in ctx && ctx.token) {
    const { organisation, roles, token } = ctx;
    return {
      ...person, organisations: [{ ...organisation, roles }],
      token: { id: token.id, name: token.name, code: await slugOfCode(ctx, token.codeId), scopes: token.scopes },
    };
  }
  const memberships = await withUser(ctx, ctx.userId, (trx) => listMembershipsOfUser(trx, ctx.userId));
  const organisations = memberships.map(({ id, slug, name, roles }) => ({ id, slug, name, roles: roleSchema.array().parse(roles) }));
  return { ...person, organisations, token: null };
}

async function slugOfCode(ctx: MemberContext, codeId: string | null): Promise<string | null> {
  if (codeId === null) return null;
  const code = await withOrganisation(ctx, (trx) => findCode(trx, ctx.organisation.id, keyOf(codeId)));
  return code?.slug ?? null;
}
