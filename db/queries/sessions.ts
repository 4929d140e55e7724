import type { Kysely } from 'kysely';
import type { DB } from '../schema.generated';

/** Ends the sessions of a person, all but the one kept. */
export function deleteSessions(db: Kysely<DB>, userId: string, keptId: string | null) {
  return db
    .deleteFrom('sessions')
    .where('user_id', '=', userId)
    .$if(keptId !== null, (query) => query.where('id', '!=', keptId as string))
    .execute();
}
