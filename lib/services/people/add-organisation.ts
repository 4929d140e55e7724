import { insertMembership } from '@/db/queries/memberships';
import type { CreateOrganisationInput, Me } from '@/lib/domain/people/schema';
import type { UserContext } from '../context';
import { newId } from '../keys';
import { requireSession } from '../require-session';
import { withOrganisation } from '../with-organisation';
import { createOrganisation } from './create-organisation';
import { getMe } from './get-me';

/** Another organisation of somebody who has an account: they are its owner and engineer. */
export async function addOrganisation(ctx: UserContext, { name }: CreateOrganisationInput): Promise<Me['organisations'][number]> {
  requireSession(ctx);
  await ctx.limits.take('sign-up', ctx.userId);
  const id = newId();
  await withOrganisation({ db: ctx.db, organisation: { id } }, async (trx) => {
    await createOrganisation(trx, id, name);
    await insertMembership(trx, { organisation_id: id, user_id: ctx.userId, roles: ['owner', 'engineer'] });
  });
  const { organisations } = await getMe(ctx);
  const made = organisations.find((organisation) => organisation.id === id);
  if (!made) throw new Error(`Organisation ${id} was made and is not there.`);
  return made;
}
