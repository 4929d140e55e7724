import { listReleases as listReleaseRows } from '@/db/queries/releases';
import type { Release } from '@/lib/domain/codes/schema';
import { requireCode } from '../codes/require-code';
import type { MemberContext } from '../context';
import { endPage, startPage } from '../list-page';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { mapRelease } from './map-release';

interface ListQuery { limit: number; cursor?: string | undefined }

export async function listReleases(ctx: MemberContext, codeKey: string, query: ListQuery): Promise<{ items: Release[]; nextCursor: string | null }> {
  permit(ctx, 'work.read');
  const page = startPage(query);
  const rows = await withOrganisation(ctx, async (trx) => {
    const code = await requireCode(ctx, trx, codeKey);
    return listReleaseRows(trx, ctx.organisation.id, code.id, page);
  });
  return endPage(rows, query, mapRelease);
}
