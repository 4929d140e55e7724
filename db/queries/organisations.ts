import type { Insertable, Kysely } from 'kysely';
import type { DB, Organisations } from '../schema.generated';

/** False where the slug is taken. Nothing is returned by the insert itself: row-level security hides whose it is. */
export async function insertOrganisation(db: Kysely<DB>, row: Insertable<Organisations>): Promise<boolean> {
  const result = await db.insertInto('organisations').values(row).onConflict((conflict) => conflict.doNothing()).executeTakeFirst();
  return (result.numInsertedOrUpdatedRows ?? 0n) > 0n;
}

export function getOrganisation(db: Kysely<DB>, id: string) {
  return db.selectFrom('organisations').selectAll().where('id', '=', id).executeTakeFirstOrThrow();
}

/** Whoever changes who belongs waits here for the other. */
export function lockOrganisation(db: Kysely<DB>, id: string) {
  return db.selectFrom('organisations').selectAll().where('id', '=', id).forUpdate().executeTakeFirstOrThrow();
}

export function renameOrganisation(db: Kysely<DB>, id: string, name: string) {
  return db
    .updateTable('organisations')
    .set((eb) => ({ name, revision: eb('revision', '+', 1) }))
    .where('id', '=', id)
    .returningAll()
    .executeTakeFirstOrThrow();
}
