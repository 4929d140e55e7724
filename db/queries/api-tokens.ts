import { sql, type Insertable, type Kysely } from 'kysely';
import type { ApiTokens, DB } from '../schema.generated';

interface TokenIdentity {
  organisation_id: string; id: string; user_id: string; code_id: string | null; name: string; scopes: string[]; expires_at: Date | null;
}

/** By its hash, before any organisation is known: through the one function that may look. */
export async function findApiTokenBySecret(db: Kysely<DB>, secretSha256: Buffer): Promise<TokenIdentity | undefined> {
  const { rows } = await sql<TokenIdentity>`select * from find_api_token(${secretSha256})`.execute(db);
  return rows[0];
}

/** The time of use is kept to the minute, so that a busy token does not write at every call. */
export function touchApiToken(db: Kysely<DB>, organisationId: string, id: string, now: Date) {
  return db
    .updateTable('api_tokens')
    .set({ last_used_at: now })
    .where('organisation_id', '=', organisationId)
    .where('id', '=', id)
    .where((eb) => eb.or([eb('last_used_at', 'is', null), eb('last_used_at', '<', new Date(now.getTime() - 60_000))]))
    .execute();
}

export function insertApiToken(db: Kysely<DB>, row: Insertable<ApiTokens>) {
  return db.insertInto('api_tokens').values(row).returningAll().executeTakeFirstOrThrow();
}

export function listApiTokensOfUser(db: Kysely<DB>, organisationId: string, userId: string, page: { after: string | null; limit: number }) {
  return db
    .selectFrom('api_tokens')
    .leftJoin('codes', (join) => join.onRef('codes.id', '=', 'api_tokens.code_id').onRef('codes.organisation_id', '=', 'api_tokens.organisation_id'))
    .selectAll('api_tokens')
    .select('codes.slug as code_slug')
    .where('api_tokens.organisation_id', '=', organisationId)
    .where('api_tokens.user_id', '=', userId)
    .$if(page.after !== null, (query) => query.where('api_tokens.id', '<', page.after as string))
    .orderBy('api_tokens.id', 'desc')
    .limit(page.limit)
    .execute();
}

export async function deleteApiToken(db: Kysely<DB>, organisationId: string, userId: string, id: string): Promise<boolean> {
  const result = await db
    .deleteFrom('api_tokens')
    .where('organisation_id', '=', organisationId)
    .where('user_id', '=', userId)
    .where('id', '=', id)
    .executeTakeFirst();
  return result.numDeletedRows > 0n;
}
