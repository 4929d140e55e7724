import { insertOrganisation } from '@/db/queries/organisations';
import { organisationSlug } from '@/lib/domain/people/organisation-slug';
import type { Trx } from '../with-organisation';

/** Makes the organisation under the first slug that is free. The transaction must be in the organisation of that id. */
export async function createOrganisation(trx: Trx, id: string, name: string): Promise<void> {
  for (let attempt = 1; ; attempt += 1) {
    if (await insertOrganisation(trx, { id, name, slug: organisationSlug(name, attempt) })) return;
  }
}
