import type { InsertObject, Kysely, UpdateObject } from 'kysely';
import type { DB } from '../schema.generated';

const mostListed = 20;

export function insertRecheck(db: Kysely<DB>, row: InsertObject<DB, 'rechecks'>) {
  return db.insertInto('rechecks').values(row).execute();
}

function selectRechecks(db: Kysely<DB>, organisationId: string) {
  return db
    .selectFrom('rechecks')
    .innerJoin('users', 'users.id', 'rechecks.requested_by')
    .selectAll('rechecks')
    .select('users.email as requested_by_email')
    .where('rechecks.organisation_id', '=', organisationId);
}

export function findRecheck(db: Kysely<DB>, organisationId: string, id: string) {
  return selectRechecks(db, organisationId).where('rechecks.id', '=', id).executeTakeFirst();
}

export function listRechecks(db: Kysely<DB>, organisationId: string, studyId: string) {
  return selectRechecks(db, organisationId).where('rechecks.study_id', '=', studyId).orderBy('rechecks.created_at', 'desc').limit(mostListed).execute();
}

export type RecheckRow = Awaited<ReturnType<typeof listRechecks>>[number];

/** Whether it was still running. */
export async function finishRecheck(db: Kysely<DB>, organisationId: string, id: string, changes: UpdateObject<DB, 'rechecks'>): Promise<boolean> {
  const result = await db
    .updateTable('rechecks')
    .set({ ...changes, state: 'done' })
    .where('organisation_id', '=', organisationId)
    .where('id', '=', id)
    .where('state', '=', 'running')
    .executeTakeFirst();
  return result.numUpdatedRows > 0n;
}
