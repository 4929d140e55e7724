import { lockOrganisation, renameOrganisation } from '@/db/queries/organisations';
import type { Organisation, UpdateOrganisationInput } from '@/lib/domain/organisation/schema';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { staleRevision } from '../stale-revision';
import { withOrganisation } from '../with-organisation';
import { mapOrganisation } from './map-organisation';

/** Renames the organisation; its short name in addresses stays. */
export async function updateOrganisation(ctx: MemberContext, revision: number, { name }: UpdateOrganisationInput): Promise<Organisation> {
  permit(ctx, 'people.manage');
  return withOrganisation(ctx, async (trx) => {
    const present = await lockOrganisation(trx, ctx.organisation.id);
    if (present.revision !== revision) throw staleRevision('organisation', present.revision, revision);
    return mapOrganisation(await renameOrganisation(trx, ctx.organisation.id, name));
  });
}
