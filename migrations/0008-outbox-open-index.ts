import { sql, type Kysely } from 'kysely';

/** Failed rows come again: an index without them could not serve the search for what is due. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    drop index outbox_open_idx;
    create index outbox_open_idx on outbox (due_at) where state in ('waiting', 'queued', 'failed');
  `.execute(db);
}
