import { listCodes as listCodeRows } from '@/db/queries/codes';
import type { Code } from '@/lib/domain/codes/schema';
import type { MemberContext } from '../context';
import { endPage, startPage } from '../list-page';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { mapCode } from './map-code';

export async function listCodes(ctx: MemberContext, query: { limit: number; cursor?: string | undefined }): Promise<{ items: Code[]; nextCursor: string | null }> {
  permit(ctx, 'work.read');
  const page = { ...startPage(query), onlyId: ctx.token?.codeId ?? null };
  const rows = await withOrganisation(ctx, (trx) => listCodeRows(trx, ctx.organisation.id, page));
  return endPage(rows, query, mapCode);
}
