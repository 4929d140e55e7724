import { findInvitation, findInvitationBySecret, type InvitationRow } from '@/db/queries/invitations';
import { AppError } from '@/lib/errors';
import type { Context } from '../context';
import { sha256Of } from '../secret-token';
import { withOrganisation } from '../with-organisation';

/** The invitation of a link, whatever its state; 404 where no link is known by that token, or not any more. */
export async function openInvitation(ctx: Pick<Context, 'db'>, token: string): Promise<InvitationRow> {
  const found = await findInvitationBySecret(ctx.db, sha256Of(token));
  const row = found && await withOrganisation({ db: ctx.db, organisation: { id: found.organisation_id } }, (trx) => findInvitation(trx, found.organisation_id, found.id));
  if (!row) throw new AppError('not-found', 'This invitation is not known. It may have been sent again since: open the newest mail.');
  return row;
}
