import { findCode, type CodeRow } from '@/db/queries/codes';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { keyOf } from '../keys';
import { permitCode } from '../permit';
import type { Trx } from '../with-organisation';

/** The code of an id or slug, or 404: also where it is another organisation's, or out of the token's reach. */
export async function requireCode(ctx: MemberContext, trx: Trx, key: string): Promise<CodeRow> {
  const row = await findCode(trx, ctx.organisation.id, keyOf(key));
  if (!row) throw new AppError('not-found', `There is no code “${key}”.`);
  permitCode(ctx, row.id);
  return row;
}
