import { replaceAuditorGrants } from '@/db/queries/auditor-grants';
import { updatePendingInvitation, type InvitationRow } from '@/db/queries/invitations';
import { deleteMembership, findMember, insertMembership } from '@/db/queries/memberships';
import { insertUser } from '@/db/queries/users';
import type { AcceptInvitationInput } from '@/lib/domain/invitations/schema';
import type { Me } from '@/lib/domain/people/schema';
import { AppError } from '@/lib/errors';
import type { Context } from '../context';
import { getMe } from '../people/get-me';
import { refuseDuplicate } from '../unique-violation';
import { withOrganisation, type Trx } from '../with-organisation';
import { guestOf, type Guest } from './guest';
import { stateOfInvitation } from './map-invitation';
import { openInvitation } from './open-invitation';

const words = {
  accepted: 'This invitation was accepted already. Sign in.',
  revoked: 'This invitation was revoked. Ask whoever invited you for another.',
  expired: 'This invitation has expired. Ask whoever invited you to send it again.',
} as const;

function requirePending(row: InvitationRow, now: Date): void {
  const state = stateOfInvitation(row, now);
  if (state !== 'pending') throw new AppError('wrong-state', words[state]);
}

async function join(trx: Trx, row: InvitationRow, userId: string): Promise<void> {
  const present = await findMember(trx, row.organisation_id, userId);
  // Access of an auditor that has ended stands there still; this one takes its place.
  if (present?.until) await deleteMembership(trx, row.organisation_id, userId);
  else if (present) throw new AppError('already-exists', 'You are a member of this organisation already.');
  await insertMembership(trx, { organisation_id: row.organisation_id, user_id: userId, roles: row.roles, until: row.until });
  await replaceAuditorGrants(trx, row.organisation_id, userId, row.code_ids ?? []);
}

interface Acceptance { address: string; signedIn: { userId: string; email: string } | null; input: AcceptInvitationInput }

/**
 * Makes the holder of the link a member: as the person signed in, as the account of the address by its password, or as a
 * new account. Whether a session is to be made is told beside. Accepted twice at once, one of the calls is refused.
 */
export async function acceptInvitation(ctx: Context, { address, signedIn, input }: Acceptance): Promise<{ me: Me; needsSession: boolean }> {
  await ctx.limits.take('link', address);
  const row = await openInvitation(ctx, input.token);
  requirePending(row, ctx.clock());
  const guest: Guest = await guestOf(ctx, row, { address, signedIn, password: input.password });
  const taken = `There is an account for ${row.email} by now. Accept again with its password.`;
  await refuseDuplicate('users_email_key', 'password', taken, () => withOrganisation({ db: ctx.db, organisation: { id: row.organisation_id } }, async (trx) => {
    if (guest.newPasswordHash !== null) await insertUser(trx, { id: guest.userId, email: row.email, password_hash: guest.newPasswordHash });
    if (!(await updatePendingInvitation(trx, row.organisation_id, row.id, { state: 'accepted', accepted_by: guest.userId }))) {
      throw new AppError('wrong-state', 'This invitation was accepted or revoked just now.');
    }
    await join(trx, row, guest.userId);
  }));
  return { me: await getMe({ ...ctx, userId: guest.userId, email: row.email, token: null }), needsSession: signedIn === null };
}
