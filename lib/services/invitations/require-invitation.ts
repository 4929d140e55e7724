import { findInvitation, type InvitationRow } from '@/db/queries/invitations';
import { listLatestMails } from '@/db/queries/mails';
import type { Invitation } from '@/lib/domain/invitations/schema';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { keyOf } from '../keys';
import type { Trx } from '../with-organisation';
import { mapInvitation } from './map-invitation';

export async function requireInvitation(ctx: MemberContext, trx: Trx, key: string): Promise<InvitationRow> {
  const { id } = keyOf(key);
  const row = id === null ? undefined : await findInvitation(trx, ctx.organisation.id, id);
  if (!row) throw new AppError('not-found', `There is no invitation “${key}”.`);
  return row;
}

/** An invitation as its owners see it, with how far its mail is. */
export async function readInvitation(ctx: MemberContext, trx: Trx, id: string): Promise<Invitation> {
  const row = await requireInvitation(ctx, trx, id);
  const [mail] = await listLatestMails(trx, ctx.organisation.id, [row.id]);
  return mapInvitation(row, mail, ctx.clock());
}
