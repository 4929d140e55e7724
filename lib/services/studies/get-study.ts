import type { Study } from '@/lib/domain/studies/schema';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { mapStudy } from './map-study';
import { requireStudy } from './require-study';

export async function getStudy(ctx: MemberContext, id: string, revision?: number): Promise<Study> {
  permit(ctx, 'work.read');
  const study = await withOrganisation(ctx, async (trx) => mapStudy(ctx, trx, await requireStudy(ctx, trx, id, revision)));
  // Asked when the transaction is over: the queue may take seconds to say nothing.
  if (study.waiting) study.waiting.workerSeen = await ctx.isWorkerSeen();
  return study;
}
