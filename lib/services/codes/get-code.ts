import type { Code } from '@/lib/domain/codes/schema';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { mapCode } from './map-code';
import { requireCode } from './require-code';

export async function getCode(ctx: MemberContext, key: string): Promise<Code> {
  permit(ctx, 'work.read');
  return withOrganisation(ctx, async (trx) => mapCode(await requireCode(ctx, trx, key)));
}
