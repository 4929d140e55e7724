import type { Kysely } from 'kysely';
import type { DB } from '../schema.generated';
import { json } from '../json';

export interface IdempotencyKeyAt { organisationId: string; actorId: string; key: string }

/** True where the key was free and is now claimed. */
export async function claimIdempotencyKey(db: Kysely<DB>, at: IdempotencyKeyAt, requestSha256: string, olderThan: Date): Promise<boolean> {
  await db
    .deleteFrom('idempotency_keys')
    .where('organisation_id', '=', at.organisationId).where('actor_id', '=', at.actorId).where('key', '=', at.key)
    .where('created_at', '<', olderThan)
    .execute();
  const inserted = await db
    .insertInto('idempotency_keys')
    .values({ organisation_id: at.organisationId, actor_id: at.actorId, key: at.key, request_sha256: requestSha256 })
    .onConflict((conflict) => conflict.doNothing())
    .returning('key')
    .executeTakeFirst();
  return inserted !== undefined;
}

export function getIdempotencyKey(db: Kysely<DB>, at: IdempotencyKeyAt) {
  return db
    .selectFrom('idempotency_keys')
    .select(['request_sha256', 'status', 'body', 'created_at'])
    .where('organisation_id', '=', at.organisationId).where('actor_id', '=', at.actorId).where('key', '=', at.key)
    .executeTakeFirst();
}

export function updateIdempotencyKey(db: Kysely<DB>, at: IdempotencyKeyAt, status: number, body: unknown) {
  return db
    .updateTable('idempotency_keys')
    .set({ status, body: json(body ?? null) })
    .where('organisation_id', '=', at.organisationId).where('actor_id', '=', at.actorId).where('key', '=', at.key)
    .execute();
}

export function deleteIdempotencyKey(db: Kysely<DB>, at: IdempotencyKeyAt) {
  return db
    .deleteFrom('idempotency_keys')
    .where('organisation_id', '=', at.organisationId).where('actor_id', '=', at.actorId).where('key', '=', at.key)
    .execute();
}

/** Removes the keys of an organisation that were claimed before a moment; how many. */
export async function deleteOldIdempotencyKeys(db: Kysely<DB>, organisationId: string, before: Date): Promise<number> {
  const removed = await db.deleteFrom('idempotency_keys').where('organisation_id', '=', organisationId).where('created_at', '<', before).executeTakeFirst();
  return Number(removed.numDeletedRows);
}
