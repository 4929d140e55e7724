import type { Kysely } from 'kysely';
import type { DB } from '../schema.generated';

export function listMailPreferences(db: Kysely<DB>, userId: string) {
  return db.selectFrom('mail_preferences').select(['kind', 'wanted']).where('user_id', '=', userId).execute();
}

export function setMailPreference(db: Kysely<DB>, row: { user_id: string; kind: string; wanted: boolean }) {
  return db
    .insertInto('mail_preferences')
    .values(row)
    .onConflict((conflict) => conflict.columns(['user_id', 'kind']).doUpdateSet({ wanted: row.wanted }))
    .execute();
}
