import { findProblem, type ProblemRow } from '@/db/queries/problems';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { keyOf } from '../keys';
import type { Trx } from '../with-organisation';

/** The problem of an id or slug with its latest revision, or 404. A token limited to a code sees them all. */
export async function requireProblem(ctx: MemberContext, trx: Trx, key: string): Promise<ProblemRow> {
  const row = await findProblem(trx, ctx.organisation.id, keyOf(key));
  if (!row) throw new AppError('not-found', `There is no problem “${key}”.`);
  return row;
}
