import { getOrganisation } from '@/db/queries/organisations';
import { findUserByEmail } from '@/db/queries/users';
import type { OpenInvitation } from '@/lib/domain/invitations/schema';
import type { Context } from '../context';
import { withOrganisation } from '../with-organisation';
import { mapOffer } from './map-invitation';
import { openInvitation } from './open-invitation';

/** What the holder of the link is offered, before they accept. */
export async function lookUpInvitation(ctx: Context, address: string, token: string): Promise<OpenInvitation> {
  await ctx.limits.take('link', address);
  const row = await openInvitation(ctx, token);
  const { name } = await withOrganisation({ db: ctx.db, organisation: { id: row.organisation_id } }, (trx) => getOrganisation(trx, row.organisation_id));
  return { organisation: name, ...mapOffer(row, ctx.clock()), hasAccount: (await findUserByEmail(ctx.db, row.email)) !== undefined };
}
