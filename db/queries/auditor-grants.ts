import type { Kysely } from 'kysely';
import type { DB } from '../schema.generated';

/** The codes an auditor may see; none: every code. */
export async function replaceAuditorGrants(db: Kysely<DB>, organisationId: string, userId: string, codeIds: readonly string[]): Promise<void> {
  await db.deleteFrom('auditor_grants').where('organisation_id', '=', organisationId).where('user_id', '=', userId).execute();
  if (codeIds.length === 0) return;
  await db.insertInto('auditor_grants').values(codeIds.map((code_id) => ({ organisation_id: organisationId, user_id: userId, code_id }))).execute();
}
