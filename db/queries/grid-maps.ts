import { sql, type InsertObject, type Kysely } from 'kysely';
import type { DB } from '../schema.generated';

export type GridMapRow = Omit<InsertObject<DB, 'grid_maps'>, 'organisation_id' | 'grid_id'>;

/** The maps of a grid are those of its last reading. */
export async function replaceGridMaps(db: Kysely<DB>, organisationId: string, gridId: string, maps: GridMapRow[]): Promise<void> {
  await db.deleteFrom('grid_maps').where('organisation_id', '=', organisationId).where('grid_id', '=', gridId).execute();
  if (maps.length === 0) return;
  await db.insertInto('grid_maps').values(maps.map((map) => ({ ...map, organisation_id: organisationId, grid_id: gridId }))).execute();
}

/** What there is, without the bins. */
export function listGridMaps(db: Kysely<DB>, organisationId: string, gridId: string) {
  return db
    .selectFrom('grid_maps')
    .select(['field', 'plane', 'width', 'height', 'bounds', 'largest'])
    .where('organisation_id', '=', organisationId)
    .where('grid_id', '=', gridId)
    .orderBy('field')
    .orderBy('plane')
    .execute();
}

export function findGridMap(db: Kysely<DB>, organisationId: string, gridId: string, { field, plane }: { field: string; plane: string }) {
  return db
    .selectFrom('grid_maps')
    .selectAll()
    .where('organisation_id', '=', organisationId)
    .where('grid_id', '=', gridId)
    .where('field', '=', field)
    .where('plane', '=', plane)
    .executeTakeFirst();
}

/** With the result, to the grid of the next revision. */
export function copyGridMaps(db: Kysely<DB>, organisationId: string, from: string, to: string) {
  return db
    .insertInto('grid_maps')
    .columns(['organisation_id', 'grid_id', 'field', 'plane', 'width', 'height', 'bounds', 'largest', 'shares'])
    .expression((eb) => eb
      .selectFrom('grid_maps')
      .select(['organisation_id', sql<string>`${to}::uuid`.as('grid_id'), 'field', 'plane', 'width', 'height', 'bounds', 'largest', 'shares'])
      .where('organisation_id', '=', organisationId)
      .where('grid_id', '=', from))
    .execute();
}
