import { insertInvitation, revokeExpiredInvitations } from '@/db/queries/invitations';
import { findMemberByEmail } from '@/db/queries/memberships';
import { invitationEnd } from '@/lib/domain/invitations/days';
import type { CreateInvitationInput, Invitation } from '@/lib/domain/invitations/schema';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { newId } from '../keys';
import { codeIdsOf } from '../people/code-ids';
import { futureEnd } from '../people/future-end';
import { permit } from '../permit';
import { refuseDuplicate } from '../unique-violation';
import { withOrganisation } from '../with-organisation';
import { queueInvitationMail } from './queue-invitation-mail';
import { readInvitation, requireInvitation } from './require-invitation';

/** Invites an address by mail. */
export async function createInvitation(ctx: MemberContext, input: CreateInvitationInput): Promise<Invitation> {
  permit(ctx, 'people.manage');
  const now = ctx.clock();
  const until = futureEnd(input.until, now);
  await ctx.limits.take('invitation', ctx.organisation.id);
  const pending = `${input.email} is invited already. Send that invitation again, or revoke it first.`;
  return refuseDuplicate('invitations_pending_key', 'email', pending, () => withOrganisation(ctx, async (trx) => {
    if (await findMemberByEmail(trx, ctx.organisation.id, input.email)) {
      const message = `${input.email} is a member already. Change their roles under Members.`;
      throw new AppError('already-exists', message, { fields: [{ path: 'email', message }] });
    }
    await revokeExpiredInvitations(trx, ctx.organisation.id, input.email, now);
    const id = newId();
    await insertInvitation(trx, {
      organisation_id: ctx.organisation.id, id, email: input.email, roles: input.roles, code_ids: await codeIdsOf(ctx, trx, input.codes), until,
      expires_at: invitationEnd(now), invited_by: ctx.userId,
    });
    await queueInvitationMail(ctx, trx, await requireInvitation(ctx, trx, id));
    return readInvitation(ctx, trx, id);
  }));
}
