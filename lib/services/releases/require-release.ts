import { findRelease, type ReleaseRow } from '@/db/queries/releases';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { keyOf } from '../keys';
import type { Trx } from '../with-organisation';

/** The release of a code by version or id, or 404. */
export async function requireRelease(ctx: MemberContext, trx: Trx, code: { id: string; slug: string }, key: string): Promise<ReleaseRow> {
  const row = await findRelease(trx, ctx.organisation.id, code.id, keyOf(key));
  if (!row) throw new AppError('not-found', `There is no release “${key}” of ${code.slug}.`);
  return row;
}
