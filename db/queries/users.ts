import type { Kysely } from 'kysely';
import type { DB } from '../schema.generated';

export function findUserByEmail(db: Kysely<DB>, email: string) {
  return db.selectFrom('users').selectAll().where('email', '=', email).executeTakeFirst();
}

export function getUser(db: Kysely<DB>, id: string) {
  return db.selectFrom('users').select(['id', 'email', 'password_hash']).where('id', '=', id).executeTakeFirstOrThrow();
}

export function insertUser(db: Kysely<DB>, row: { id: string; email: string; password_hash: string }) {
  return db.insertInto('users').values(row).execute();
}

export function updatePassword(db: Kysely<DB>, id: string, passwordHash: string) {
  return db.updateTable('users').set({ password_hash: passwordHash }).where('id', '=', id).execute();
}
