import type { Case } from '@/lib/domain/cases/schema';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { mapCase } from './map-case';
import { requireCase } from './require-case';

export async function getCase(ctx: MemberContext, key: string): Promise<Case> {
  permit(ctx, 'work.read');
  return withOrganisation(ctx, async (trx) => mapCase(await requireCase(ctx, trx, key)));
}
