import { listRechecks as findRechecks } from '@/db/queries/rechecks';
import type { Recheck } from '@/lib/domain/studies/recheck-schema';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { requireStudy } from '../studies/require-study';
import { withOrganisation } from '../with-organisation';
import { mapRecheck } from './map-recheck';

/** The newest first. */
export async function listRechecks(ctx: MemberContext, studyId: string): Promise<{ items: Recheck[] }> {
  permit(ctx, 'work.read');
  return withOrganisation(ctx, async (trx) => {
    const { at } = await requireStudy(ctx, trx, studyId);
    return { items: (await findRechecks(trx, at.organisationId, at.studyId)).map(mapRecheck) };
  });
}
