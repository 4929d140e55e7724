import { listInvitations as listInvitationRows } from '@/db/queries/invitations';
import { listLatestMails } from '@/db/queries/mails';
import type { Invitation } from '@/lib/domain/invitations/schema';
import type { MemberContext } from '../context';
import { endPage, startPage } from '../list-page';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { mapInvitation } from './map-invitation';

export async function listInvitations(ctx: MemberContext, query: { limit: number; cursor?: string | undefined }): Promise<{ items: Invitation[]; nextCursor: string | null }> {
  permit(ctx, 'people.read');
  const page = startPage(query);
  return withOrganisation(ctx, async (trx) => {
    const rows = await listInvitationRows(trx, ctx.organisation.id, page);
    const mails = await listLatestMails(trx, ctx.organisation.id, rows.map(({ id }) => id));
    const now = ctx.clock();
    return endPage(rows, query, (row) => mapInvitation(row, mails.find(({ subject_id }) => subject_id === row.id), now));
  });
}
