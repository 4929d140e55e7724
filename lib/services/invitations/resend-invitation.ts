import { updatePendingInvitation } from '@/db/queries/invitations';
import { invitationEnd } from '@/lib/domain/invitations/days';
import type { Invitation } from '@/lib/domain/invitations/schema';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { queueInvitationMail } from './queue-invitation-mail';
import { readInvitation, requireInvitation } from './require-invitation';

/** Sends an invitation again, also one that has expired; the link of the mail before is void once the new one goes out. */
export async function resendInvitation(ctx: MemberContext, key: string): Promise<Invitation> {
  permit(ctx, 'people.manage');
  await ctx.limits.take('invitation', ctx.organisation.id);
  return withOrganisation(ctx, async (trx) => {
    const row = await requireInvitation(ctx, trx, key);
    if (!(await updatePendingInvitation(trx, ctx.organisation.id, row.id, { expires_at: invitationEnd(ctx.clock()) }))) {
      throw new AppError('wrong-state', `The invitation of ${row.email} is ${row.state}. Invite ${row.email} anew instead.`);
    }
    await queueInvitationMail(ctx, trx, row);
    return readInvitation(ctx, trx, row.id);
  });
}
