import { replaceAuditorGrants } from '@/db/queries/auditor-grants';
import { updateMembership } from '@/db/queries/memberships';
import type { Member, UpdateMemberInput } from '@/lib/domain/members/schema';
import type { Role } from '@/lib/domain/people/roles';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { queueMail } from '../mail/queue-mail';
import { codeIdsOf } from '../people/code-ids';
import { futureEnd } from '../people/future-end';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { announceMembership } from './announce-membership';
import { mapMember } from './map-member';
import { keepAnOwner, lockMember } from './require-member';

/** Roles that nobody gives to themselves, since they stand for a second person's judgement. */
const givenByOthers: readonly Role[] = ['reviewer', 'owner'];

function refuseSelfPromotion(before: readonly string[], after: readonly Role[]): void {
  const taken = givenByOthers.find((role) => after.includes(role) && !before.includes(role));
  if (taken === undefined) return;
  const message = `Nobody makes themselves ${taken}. Ask another owner.`;
  throw new AppError('not-allowed', message, { fields: [{ path: 'roles', message }] });
}

/** Changes what a member may do, at once and for their tokens too; they are told by mail. */
export async function updateMember(ctx: MemberContext, key: string, input: UpdateMemberInput): Promise<Member> {
  permit(ctx, 'people.manage');
  const until = futureEnd(input.until, ctx.clock());
  const changed = await withOrganisation(ctx, async (trx) => {
    const member = await lockMember(ctx, trx, key);
    if (member.id === ctx.userId) refuseSelfPromotion(member.roles, input.roles);
    if (!input.roles.includes('owner')) await keepAnOwner(ctx, trx, member);
    await updateMembership(trx, ctx.organisation.id, member.id, { roles: input.roles, until });
    await replaceAuditorGrants(trx, ctx.organisation.id, member.id, (await codeIdsOf(ctx, trx, input.codes)) ?? []);
    const { name: organisation, slug } = ctx.organisation;
    if (member.id !== ctx.userId) {
      await queueMail(trx, {
        organisationId: ctx.organisation.id, userId: member.id, address: member.email, subjectId: null,
        facts: { kind: 'membership-changed', organisation, slug, by: ctx.email, roles: input.roles, until: until?.toISOString() ?? null },
      });
    }
    return lockMember(ctx, trx, member.id);
  });
  await announceMembership(ctx, ctx.organisation.id, changed.id);
  return mapMember(changed);
}
