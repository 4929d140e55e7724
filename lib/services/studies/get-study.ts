import type { Study } from '@/lib/domain/studies/schema';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { mapStudy } from './map-study';
import { requireStudy } from './require-study';

export async function getStudy(ctx: MemberContext, id: string, revision?: number): Promise<Study> {
  permit(ctx, 'work.read');
  return withOrganisation(ctx, async (trx) => mapStudy(trx, await requireStudy(ctx, trx, id, revision)));
}
