import { listCasesOnProblems } from '@/db/queries/cases';
import { listProblems as listProblemRows } from '@/db/queries/problems';
import type { Problem } from '@/lib/domain/problems/schema';
import type { MemberContext } from '../context';
import { endPage, startPage } from '../list-page';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { mapProblem } from './map-problem';

interface ListQuery { limit: number; cursor?: string | undefined }

export async function listProblems(ctx: MemberContext, query: ListQuery): Promise<{ items: Problem[]; nextCursor: string | null }> {
  permit(ctx, 'work.read');
  const page = startPage(query);
  return withOrganisation(ctx, async (trx) => {
    const rows = await listProblemRows(trx, ctx.organisation.id, page);
    const cases = await listCasesOnProblems(trx, ctx.organisation.id, rows.map((row) => row.id), ctx.token?.codeId ?? null);
    return endPage(rows, query, (row) => mapProblem(row, cases));
  });
}
