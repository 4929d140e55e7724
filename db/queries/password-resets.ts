import type { Insertable, Kysely, UpdateObject } from 'kysely';
import type { DB, PasswordResets } from '../schema.generated';

export function insertPasswordReset(db: Kysely<DB>, row: Insertable<PasswordResets>) {
  return db.insertInto('password_resets').values(row).execute();
}

/** Held until the transaction ends, so that a link serves once. */
export function lockPasswordReset(db: Kysely<DB>, tokenSha256: Buffer) {
  return db.selectFrom('password_resets').selectAll().where('token_sha256', '=', tokenSha256).forUpdate().executeTakeFirst();
}

/** Changes one that was not used; whether it was so. */
export async function updateUnusedReset(db: Kysely<DB>, id: string, changes: UpdateObject<DB, 'password_resets'>): Promise<boolean> {
  const changed = await db.updateTable('password_resets').set(changes).where('id', '=', id).where('used_at', 'is', null).executeTakeFirst();
  return changed.numUpdatedRows > 0n;
}

/** Every other link of the person is void. */
export function voidResets(db: Kysely<DB>, userId: string, now: Date) {
  return db.updateTable('password_resets').set({ used_at: now }).where('user_id', '=', userId).where('used_at', 'is', null).execute();
}
