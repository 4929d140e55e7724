import { sql, type Insertable, type Kysely, type Updateable } from 'kysely';
import type { DB, Outbox } from '../schema.generated';

export function insertOutboxRow(db: Kysely<DB>, row: Insertable<Outbox>) {
  return db.insertInto('outbox').values(row).execute();
}

/** Rows that want to be queued and are due, held until the transaction ends; what another process holds is passed over. */
export function lockWaitingOutboxRows(db: Kysely<DB>, now: Date, limit: number) {
  return db
    .selectFrom('outbox')
    .selectAll()
    .where('state', 'in', ['waiting', 'failed'])
    .where('due_at', '<=', now)
    .orderBy('due_at')
    .limit(limit)
    .forUpdate()
    .skipLocked()
    .execute();
}

export function updateOutboxRow(db: Kysely<DB>, id: string, changes: Updateable<Outbox>) {
  return db.updateTable('outbox').set(changes).where('id', '=', id).execute();
}

/** Rows queued before a moment and not done. */
export function listQueuedOutboxRows(db: Kysely<DB>, before: Date) {
  return db.selectFrom('outbox').selectAll().where('state', '=', 'queued').where('queued_at', '<', before).execute();
}

/** Of an attempt that is still the last one and has not ended: failed, and due again later; whether it was so. */
export async function failOutboxRow(db: Kysely<DB>, { id, attempt }: { id: string; attempt: number }, changes: { last_error: string; due_at: Date }): Promise<boolean> {
  const changed = await db
    .updateTable('outbox')
    .set({ state: 'failed', ...changes })
    .where('id', '=', id)
    .where('attempt', '=', attempt)
    .where('state', '=', 'queued')
    .executeTakeFirst();
  return changed.numUpdatedRows > 0n;
}

/** Back to waiting, unless the attempt has moved on meanwhile. */
export function requeueOutboxRow(db: Kysely<DB>, id: string, attempt: number) {
  return db
    .updateTable('outbox')
    .set({ state: 'waiting', due_at: sql<Date>`now()` })
    .where('id', '=', id)
    .where('attempt', '=', attempt)
    .where('state', '=', 'queued')
    .execute();
}

/** Removes rows that were done before a moment, some at a time; how many. */
export async function deleteDoneOutboxRows(db: Kysely<DB>, before: Date, limit: number): Promise<number> {
  const removed = await db
    .deleteFrom('outbox')
    .where('id', 'in', (eb) => eb.selectFrom('outbox').select('id').where('state', '=', 'done').where('done_at', '<', before).limit(limit).forUpdate().skipLocked())
    .executeTakeFirst();
  return Number(removed.numDeletedRows);
}

/** How many rows are not done, and since when the oldest, by job and state. */
export function countOpenOutboxRows(db: Kysely<DB>) {
  return db
    .selectFrom('outbox')
    .select(['job', 'state', (eb) => eb.fn.countAll<string>().as('count'), (eb) => eb.fn.min('created_at').as('oldest')])
    .where('state', 'in', ['waiting', 'queued', 'failed'])
    .groupBy(['job', 'state'])
    .execute();
}
