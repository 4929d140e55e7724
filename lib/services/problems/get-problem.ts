import { listCasesOnProblems } from '@/db/queries/cases';
import type { Problem } from '@/lib/domain/problems/schema';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { mapProblem } from './map-problem';
import { requireProblem } from './require-problem';

export async function getProblem(ctx: MemberContext, key: string): Promise<Problem> {
  permit(ctx, 'work.read');
  return withOrganisation(ctx, async (trx) => {
    const row = await requireProblem(ctx, trx, key);
    return mapProblem(row, await listCasesOnProblems(trx, ctx.organisation.id, [row.id], ctx.token?.codeId ?? null));
  });
}
