import { listApiTokensOfUser } from '@/db/queries/api-tokens';
import type { Token } from '@/lib/domain/tokens/schema';
import type { MemberContext } from '../context';
import { endPage, startPage } from '../list-page';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { mapToken } from './map-token';

export async function listTokens(ctx: MemberContext, query: { limit: number; cursor?: string | undefined }): Promise<{ items: Token[]; nextCursor: string | null }> {
  permit(ctx, 'tokens.manage');
  const page = startPage(query);
  const rows = await withOrganisation(ctx, (trx) => listApiTokensOfUser(trx, ctx.organisation.id, ctx.userId, page));
  return endPage(rows, query, mapToken);
}
