import { deleteMembership } from '@/db/queries/memberships';
import type { MemberContext } from '../context';
import { queueMail } from '../mail/queue-mail';
import { permit } from '../permit';
import { requireSession } from '../require-session';
import { withOrganisation } from '../with-organisation';
import { announceMembership } from './announce-membership';
import { keepAnOwner, lockMember } from './require-member';

/** Ends a membership at once, with its tokens; what the person did keeps their name. Anybody may leave. */
export async function removeMember(ctx: MemberContext, key: string): Promise<void> {
  if (key === ctx.userId) requireSession(ctx);
  else permit(ctx, 'people.manage');
  const { id } = await withOrganisation(ctx, async (trx) => {
    const member = await lockMember(ctx, trx, key);
    await keepAnOwner(ctx, trx, member);
    await deleteMembership(trx, ctx.organisation.id, member.id);
    const { name: organisation, slug } = ctx.organisation;
    if (member.id !== ctx.userId) {
      await queueMail(trx, {
        organisationId: ctx.organisation.id, userId: member.id, address: member.email, subjectId: null,
        facts: { kind: 'membership-changed', organisation, slug, by: ctx.email, roles: null, until: null },
      });
    }
    return member;
  });
  await announceMembership(ctx, ctx.organisation.id, id);
}
