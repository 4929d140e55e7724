import { listCases as listCaseRows } from '@/db/queries/cases';
import type { Case } from '@/lib/domain/cases/schema';
import { requireCode } from '../codes/require-code';
import type { MemberContext } from '../context';
import { endPage, startPage } from '../list-page';
import { permit } from '../permit';
import { requireProblem } from '../problems/require-problem';
import { withOrganisation } from '../with-organisation';
import { mapCase } from './map-case';

interface ListQuery { limit: number; cursor?: string | undefined; code?: string | undefined; problem?: string | undefined }

export async function listCases(ctx: MemberContext, query: ListQuery): Promise<{ items: Case[]; nextCursor: string | null }> {
  permit(ctx, 'work.read');
  const page = startPage(query);
  const rows = await withOrganisation(ctx, async (trx) => {
    const code = query.code === undefined ? null : await requireCode(ctx, trx, query.code);
    const problem = query.problem === undefined ? null : await requireProblem(ctx, trx, query.problem);
    const codeId = code?.id ?? ctx.token?.codeId ?? null;
    return listCaseRows(trx, ctx.organisation.id, { ...page, codeId, problemId: problem?.id ?? null });
  });
  return endPage(rows, query, mapCase);
}
