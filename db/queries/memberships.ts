import type { Kysely } from 'kysely';
import type { DB } from '../schema.generated';

/** Needs `app.user_id` or the organisation to be set: row-level security shows nothing else. */
export function listMembershipsOfUser(db: Kysely<DB>, userId: string) {
  return db
    .selectFrom('memberships')
    .innerJoin('organisations', 'organisations.id', 'memberships.organisation_id')
    .select(['organisations.id', 'organisations.slug', 'organisations.name', 'memberships.roles'])
    .where('memberships.user_id', '=', userId)
    .orderBy('memberships.created_at')
    .execute();
}

export function insertMembership(db: Kysely<DB>, row: { organisation_id: string; user_id: string; roles: string[] }) {
  return db.insertInto('memberships').values(row).execute();
}
