import type { Insertable, Kysely } from 'kysely';
import type { DB, Organisations } from '../schema.generated';

/** False where the slug is taken. Nothing is returned by the insert itself: row-level security hides whose it is. */
export async function insertOrganisation(db: Kysely<DB>, row: Insertable<Organisations>): Promise<boolean> {
  const result = await db.insertInto('organisations').values(row).onConflict((conflict) => conflict.doNothing()).executeTakeFirst();
  return (result.numInsertedOrUpdatedRows ?? 0n) > 0n;
}
