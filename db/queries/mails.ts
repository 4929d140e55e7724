import { sql, type InsertObject, type Kysely, type Selectable, type UpdateObject } from 'kysely';
import type { DB, Mails } from '../schema.generated';

export type MailRow = Selectable<Mails>;

export function insertMail(db: Kysely<DB>, row: InsertObject<DB, 'mails'>) {
  return db.insertInto('mails').values(row).execute();
}

/** Of an organisation, or of none. */
const ofOrganisation = (organisationId: string | null) => sql<boolean>`mails.organisation_id is not distinct from ${organisationId}::uuid`;

export function findMail(db: Kysely<DB>, organisationId: string | null, id: string) {
  return db.selectFrom('mails').selectAll().where(ofOrganisation(organisationId)).where('id', '=', id).executeTakeFirst();
}

/** The latest mail about each subject. */
export function listLatestMails(db: Kysely<DB>, organisationId: string, subjectIds: string[]) {
  if (subjectIds.length === 0) return Promise.resolve([]);
  return db
    .selectFrom('mails')
    .distinctOn('subject_id')
    .selectAll()
    .where('organisation_id', '=', organisationId)
    .where('subject_id', 'in', subjectIds)
    .orderBy('subject_id')
    .orderBy('id', 'desc')
    .execute();
}

export function listMails(db: Kysely<DB>, organisationId: string, state: string | null, page: { after: string | null; limit: number }) {
  return db
    .selectFrom('mails')
    .selectAll()
    .where('organisation_id', '=', organisationId)
    .$if(state !== null, (query) => query.where('state', '=', state as string))
    .$if(page.after !== null, (query) => query.where('id', '<', page.after as string))
    .orderBy('id', 'desc')
    .limit(page.limit)
    .execute();
}

/** Changes a mail only where it is in the state named; the row as it is then. */
export function updateMail(db: Kysely<DB>, at: { organisationId: string | null; id: string; from: string[] }, changes: UpdateObject<DB, 'mails'>) {
  return db
    .updateTable('mails')
    .set(changes)
    .where(ofOrganisation(at.organisationId))
    .where('id', '=', at.id)
    .where('state', 'in', at.from)
    .returningAll()
    .executeTakeFirst();
}

/** Mails that are not out, in every organisation, by state. */
export async function countOpenMails(db: Kysely<DB>): Promise<{ state: string; count: string }[]> {
  const { rows } = await sql<{ state: string; count: string }>`select state, count from count_open_mails()`.execute(db);
  return rows;
}
