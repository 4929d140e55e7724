import { listMembers as listMemberRows } from '@/db/queries/memberships';
import type { Member } from '@/lib/domain/members/schema';
import type { MemberContext } from '../context';
import { endPage, startPage } from '../list-page';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { mapMember } from './map-member';

export async function listMembers(ctx: MemberContext, query: { limit: number; cursor?: string | undefined }): Promise<{ items: Member[]; nextCursor: string | null }> {
  permit(ctx, 'people.read');
  const page = startPage(query);
  const rows = await withOrganisation(ctx, (trx) => listMemberRows(trx, ctx.organisation.id, page));
  return endPage(rows, query, mapMember);
}
