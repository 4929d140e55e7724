import { countOtherOwners, findMember, type MemberRow } from '@/db/queries/memberships';
import { lockOrganisation } from '@/db/queries/organisations';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { keyOf } from '../keys';
import type { Trx } from '../with-organisation';

/** A member, with everybody else who changes members made to wait: two owners must not remove each other at once. */
export async function lockMember(ctx: MemberContext, trx: Trx, key: string): Promise<MemberRow> {
  await lockOrganisation(trx, ctx.organisation.id);
  const { id } = keyOf(key);
  const row = id === null ? undefined : await findMember(trx, ctx.organisation.id, id);
  if (!row) throw new AppError('not-found', `There is no member “${key}”.`);
  return row;
}

/** An organisation without an owner could not be managed by anybody. */
export async function keepAnOwner(ctx: MemberContext, trx: Trx, member: MemberRow): Promise<void> {
  if (!member.roles.includes('owner') || (await countOtherOwners(trx, ctx.organisation.id, member.id)) > 0) return;
  throw new AppError('wrong-state', `${member.email} is the only owner of ${ctx.organisation.name}. Make somebody else owner first.`);
}
