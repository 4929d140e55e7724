import { deleteApiToken } from '@/db/queries/api-tokens';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { keyOf } from '../keys';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';

/** Of one's own tokens; the next call with it is refused. */
export async function deleteToken(ctx: MemberContext, key: string): Promise<void> {
  permit(ctx, 'tokens.manage');
  const { id } = keyOf(key);
  const isGone = id !== null && (await withOrganisation(ctx, (trx) => deleteApiToken(trx, ctx.organisation.id, ctx.userId, id)));
  if (!isGone) throw new AppError('not-found', 'There is no such token of yours.');
}
