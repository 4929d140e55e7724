import { updatePendingInvitation } from '@/db/queries/invitations';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { requireInvitation } from './require-invitation';

/** Its link is void at once. */
export async function revokeInvitation(ctx: MemberContext, key: string): Promise<void> {
  permit(ctx, 'people.manage');
  await withOrganisation(ctx, async (trx) => {
    const { id, state, email } = await requireInvitation(ctx, trx, key);
    if (await updatePendingInvitation(trx, ctx.organisation.id, id, { state: 'revoked' })) return;
    throw new AppError('wrong-state', `The invitation of ${email} is ${state} already.`);
  });
}
