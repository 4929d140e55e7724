import { AppError } from '@/lib/errors';
import { requireCode } from '../codes/require-code';
import type { MemberContext } from '../context';
import type { Trx } from '../with-organisation';

/** The ids of the codes an auditor is limited to; null: every code. A code that is not there is named. */
export async function codeIdsOf(ctx: MemberContext, trx: Trx, codes: readonly string[] | undefined): Promise<string[] | null> {
  if (codes === undefined) return null;
  const ids: string[] = [];
  for (const [index, key] of codes.entries()) {
    try {
      ids.push((await requireCode(ctx, trx, key)).id);
    } catch (cause) {
      if (!(cause instanceof AppError) || cause.code !== 'not-found') throw cause;
      throw new AppError('invalid', cause.message, { cause, fields: [{ path: `codes.${index}`, message: cause.message }] });
    }
  }
  return [...new Set(ids)];
}
