import type { Insertable, Kysely } from 'kysely';
import type { DB, Outbox } from '../schema.generated';

export function insertOutboxRow(db: Kysely<DB>, row: Insertable<Outbox>) {
  return db.insertInto('outbox').values(row).execute();
}
