import { sql, type InsertObject, type Kysely } from 'kysely';
import type { DB } from '../schema.generated';

export function upsertGridResult(db: Kysely<DB>, row: InsertObject<DB, 'grid_results'>) {
  return db
    .insertInto('grid_results')
    .values(row)
    .onConflict((conflict) => conflict.columns(['organisation_id', 'grid_id']).doUpdateSet((eb) => ({
      upload_id: eb.ref('excluded.upload_id'), mapping: eb.ref('excluded.mapping'), norms: eb.ref('excluded.norms'),
      numerics_version: eb.ref('excluded.numerics_version'), created_at: eb.ref('excluded.created_at'),
    })))
    .execute();
}

/** The same file read under the same definitions gives the same result: it is copied to the grid of the next revision. */
export function copyGridResult(db: Kysely<DB>, organisationId: string, from: string, to: string) {
  return db
    .insertInto('grid_results')
    .columns(['organisation_id', 'grid_id', 'upload_id', 'mapping', 'norms', 'numerics_version'])
    .expression((eb) => eb
      .selectFrom('grid_results')
      .select(['organisation_id', sql<string>`${to}::uuid`.as('grid_id'), 'upload_id', 'mapping', 'norms', 'numerics_version'])
      .where('organisation_id', '=', organisationId)
      .where('grid_id', '=', from))
    .execute();
}
