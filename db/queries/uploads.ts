import { sql, type Insertable, type Kysely, type Selectable, type UpdateObject } from 'kysely';
import type { DB, Uploads } from '../schema.generated';

export type UploadRow = Selectable<Uploads>;

export function insertUpload(db: Kysely<DB>, row: Insertable<Uploads>) {
  return db.insertInto('uploads').values(row).returningAll().executeTakeFirstOrThrow();
}

/** With the address of whoever sends it. */
export function findUpload(db: Kysely<DB>, organisationId: string, id: string) {
  return db
    .selectFrom('uploads')
    .innerJoin('users', 'users.id', 'uploads.created_by')
    .selectAll('uploads')
    .select('users.email as sender')
    .where('uploads.organisation_id', '=', organisationId)
    .where('uploads.id', '=', id)
    .executeTakeFirst();
}
export type SentUpload = NonNullable<Awaited<ReturnType<typeof findUpload>>>;

/** The last whole file sent for a grid, in any revision of its study, other than one upload. */
export function findStoredUpload(db: Kysely<DB>, organisationId: string, grid: { study_id: string; label: string }, otherThan: string) {
  return db
    .selectFrom('uploads')
    .innerJoin('grids', (join) => join.onRef('grids.organisation_id', '=', 'uploads.organisation_id').onRef('grids.id', '=', 'uploads.grid_id'))
    .selectAll('uploads')
    .where('uploads.organisation_id', '=', organisationId)
    .where('grids.study_id', '=', grid.study_id)
    .where('grids.label', '=', grid.label)
    .where('uploads.state', '=', 'stored')
    .where('uploads.id', '!=', otherThan)
    .orderBy('uploads.stored_at', 'desc')
    .executeTakeFirst();
}

/** Only from the state named; whether it was so. */
export async function updateUploadState(db: Kysely<DB>, organisationId: string, id: string, from: string, changes: UpdateObject<DB, 'uploads'>): Promise<boolean> {
  const changed = await db
    .updateTable('uploads')
    .set(changes)
    .where('organisation_id', '=', organisationId)
    .where('id', '=', id)
    .where('state', '=', from)
    .executeTakeFirst();
  return changed.numUpdatedRows > 0n;
}

export function updateUpload(db: Kysely<DB>, organisationId: string, id: string, changes: UpdateObject<DB, 'uploads'>) {
  return db.updateTable('uploads').set(changes).where('organisation_id', '=', organisationId).where('id', '=', id).execute();
}

/** Files on their way in every organisation. */
export async function countReceivingUploads(db: Kysely<DB>): Promise<number> {
  const { rows } = await sql<{ count: string }>`select count_receiving_uploads() as count`.execute(db);
  return Number(rows[0]?.count ?? 0);
}
