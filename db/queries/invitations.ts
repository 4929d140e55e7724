import { sql, type Insertable, type Kysely, type Selectable, type UpdateObject } from 'kysely';
import type { DB, Invitations } from '../schema.generated';

/** By the hash of its token, before any organisation is known: through the one function that may look. */
export async function findInvitationBySecret(db: Kysely<DB>, tokenSha256: Buffer): Promise<{ organisation_id: string; id: string } | undefined> {
  const { rows } = await sql<{ organisation_id: string; id: string }>`select * from find_invitation(${tokenSha256})`.execute(db);
  return rows[0];
}

export function insertInvitation(db: Kysely<DB>, row: Insertable<Invitations>) {
  return db.insertInto('invitations').values(row).execute();
}

function withNames(db: Kysely<DB>, organisationId: string) {
  return db
    .selectFrom('invitations')
    .innerJoin('users', 'users.id', 'invitations.invited_by')
    .selectAll('invitations')
    .select('users.email as invited_by_email')
    .select(sql<string[] | null>`(select array_agg(codes.slug order by codes.slug) from codes
      where codes.organisation_id = invitations.organisation_id and codes.id = any (invitations.code_ids))`.as('code_slugs'))
    .where('invitations.organisation_id', '=', organisationId);
}

export function findInvitation(db: Kysely<DB>, organisationId: string, id: string) {
  return withNames(db, organisationId).where('invitations.id', '=', id).executeTakeFirst();
}
export type InvitationRow = Selectable<Invitations> & { invited_by_email: string; code_slugs: string[] | null };

export function listInvitations(db: Kysely<DB>, organisationId: string, page: { after: string | null; limit: number }) {
  return withNames(db, organisationId)
    .$if(page.after !== null, (query) => query.where('invitations.id', '<', page.after as string))
    .orderBy('invitations.id', 'desc')
    .limit(page.limit)
    .execute();
}

/** Changes a pending invitation; whether it was one. */
export async function updatePendingInvitation(db: Kysely<DB>, organisationId: string, id: string, changes: UpdateObject<DB, 'invitations'>): Promise<boolean> {
  const changed = await db
    .updateTable('invitations')
    .set(changes)
    .where('organisation_id', '=', organisationId)
    .where('id', '=', id)
    .where('state', '=', 'pending')
    .executeTakeFirst();
  return changed.numUpdatedRows > 0n;
}

/** Makes room for another invitation of an address whose last one ran out. */
export function revokeExpiredInvitations(db: Kysely<DB>, organisationId: string, email: string, now: Date) {
  return db
    .updateTable('invitations')
    .set({ state: 'revoked' })
    .where('organisation_id', '=', organisationId)
    .where('email', '=', email)
    .where('state', '=', 'pending')
    .where('expires_at', '<=', now)
    .execute();
}
