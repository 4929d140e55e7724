import { findCase, type CaseRow } from '@/db/queries/cases';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { keyOf } from '../keys';
import { permitCode } from '../permit';
import type { Trx } from '../with-organisation';

/** The case of an id or slug with its latest revision, or 404: also where it is of a code out of the token's reach. */
export async function requireCase(ctx: MemberContext, trx: Trx, key: string): Promise<CaseRow> {
  const row = await findCase(trx, ctx.organisation.id, keyOf(key));
  if (!row) throw new AppError('not-found', `There is no case “${key}”.`);
  permitCode(ctx, row.code_id);
  return row;
}
