import { getOrganisation as getOrganisationRow } from '@/db/queries/organisations';
import type { Organisation } from '@/lib/domain/organisation/schema';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { mapOrganisation } from './map-organisation';

export async function getOrganisation(ctx: MemberContext): Promise<Organisation> {
  permit(ctx, 'people.read');
  return mapOrganisation(await withOrganisation(ctx, (trx) => getOrganisationRow(trx, ctx.organisation.id)));
}
