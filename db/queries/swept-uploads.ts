import { sql, type Kysely } from 'kysely';
import type { DB } from '../schema.generated';

/** Every organisation, by a function that tells nothing else of them. */
export async function listOrganisationIds(db: Kysely<DB>): Promise<string[]> {
  const { rows } = await sql<{ id: string }>`select list_organisation_ids() as id`.execute(db);
  return rows.map(({ id }) => id);
}

/** Open uploads of which nothing was heard since a moment. */
export function listIdleUploads(db: Kysely<DB>, organisationId: string, before: Date, limit: number) {
  return db
    .selectFrom('uploads')
    .select(['id', 'grid_id'])
    .where('organisation_id', '=', organisationId)
    .where('state', '=', 'receiving')
    .where('last_activity_at', '<', before)
    .orderBy('last_activity_at')
    .limit(limit)
    .execute();
}

/** Gives up an upload only while it is still open and idle; whether it was. */
export async function giveUpIdleUpload(db: Kysely<DB>, organisationId: string, id: string, before: Date): Promise<boolean> {
  const changed = await db
    .updateTable('uploads')
    .set({ state: 'given-up' })
    .where('organisation_id', '=', organisationId)
    .where('id', '=', id)
    .where('state', '=', 'receiving')
    .where('last_activity_at', '<', before)
    .executeTakeFirst();
  return changed.numUpdatedRows > 0n;
}

/**
 * Gives up whole files that another took the place of before a moment: no grid of any revision names them, no result was
 * made from them, and a later file of the same grid is there to go back to.
 */
export function giveUpReplacedUploads(db: Kysely<DB>, organisationId: string, before: Date, limit: number) {
  return db
    .updateTable('uploads')
    .set({ state: 'given-up' })
    .where('organisation_id', '=', organisationId)
    .where('id', 'in', (eb) => eb
      .selectFrom('uploads as old')
      .innerJoin('grids as own', (join) => join.onRef('own.organisation_id', '=', 'old.organisation_id').onRef('own.id', '=', 'old.grid_id'))
      .select('old.id')
      .where('old.organisation_id', '=', organisationId)
      .where('old.state', '=', 'stored')
      .where((eb) => eb.not(eb.exists(eb.selectFrom('grids as naming').select('naming.id')
        .where('naming.organisation_id', '=', organisationId).whereRef('naming.upload_id', '=', 'old.id'))))
      .where((eb) => eb.not(eb.exists(eb.selectFrom('grid_results').select('grid_results.grid_id')
        .where('grid_results.organisation_id', '=', organisationId).whereRef('grid_results.upload_id', '=', 'old.id'))))
      .where((eb) => eb.exists(eb.selectFrom('uploads as later')
        .innerJoin('grids as its', (join) => join.onRef('its.organisation_id', '=', 'later.organisation_id').onRef('its.id', '=', 'later.grid_id'))
        .select('later.id')
        .where('later.organisation_id', '=', organisationId)
        .whereRef('its.study_id', '=', 'own.study_id').whereRef('its.label', '=', 'own.label')
        .where('later.state', '=', 'stored').where('later.stored_at', '<', before).whereRef('later.stored_at', '>', 'old.stored_at')))
      .limit(limit))
    .returning(['id', 'storage_key'])
    .execute();
}

/** Which of these objects and parts a row still names. */
export function listNamedKeys(db: Kysely<DB>, organisationId: string, keys: string[]) {
  return db
    .selectFrom('uploads')
    .select(['storage_key', 'multipart_id', 'state'])
    .where('organisation_id', '=', organisationId)
    .where('storage_key', 'in', keys)
    .where('state', '!=', 'given-up')
    .execute();
}
