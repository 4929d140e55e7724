import type { Insertable, Kysely, Selectable } from 'kysely';
import type { Codes, DB } from '../schema.generated';

export type CodeRow = Selectable<Codes>;

export function insertCode(db: Kysely<DB>, row: Insertable<Codes>) {
  return db.insertInto('codes').values(row).returningAll().executeTakeFirstOrThrow();
}

export function listCodes(db: Kysely<DB>, organisationId: string, page: { after: string | null; limit: number; onlyId: string | null }) {
  return db
    .selectFrom('codes')
    .selectAll()
    .where('organisation_id', '=', organisationId)
    .$if(page.after !== null, (query) => query.where('id', '<', page.after as string))
    .$if(page.onlyId !== null, (query) => query.where('id', '=', page.onlyId as string))
    .orderBy('id', 'desc')
    .limit(page.limit)
    .execute();
}

/** By id or slug; an id is only compared where the text is one. */
export function findCode(db: Kysely<DB>, organisationId: string, key: { id: string | null; slug: string }) {
  return db
    .selectFrom('codes')
    .selectAll()
    .where('organisation_id', '=', organisationId)
    .where((eb) => eb.or([eb('slug', '=', key.slug), ...(key.id === null ? [] : [eb('id', '=', key.id)])]))
    .executeTakeFirst();
}
