import type { Insertable, Kysely, Selectable } from 'kysely';
import type { DB, Releases } from '../schema.generated';

export type ReleaseRow = Selectable<Releases>;

export function insertRelease(db: Kysely<DB>, row: Insertable<Releases>) {
  return db.insertInto('releases').values(row).returningAll().executeTakeFirstOrThrow();
}

/** Newest first: ids are sorted by time. */
export function listReleases(db: Kysely<DB>, organisationId: string, codeId: string, page: { after: string | null; limit: number }) {
  return db
    .selectFrom('releases')
    .selectAll()
    .where('organisation_id', '=', organisationId)
    .where('code_id', '=', codeId)
    .$if(page.after !== null, (query) => query.where('id', '<', page.after as string))
    .orderBy('id', 'desc')
    .limit(page.limit)
    .execute();
}

/** All of a code, oldest first. */
export function listReleasesOfCode(db: Kysely<DB>, organisationId: string, codeId: string) {
  return db
    .selectFrom('releases')
    .selectAll()
    .where('organisation_id', '=', organisationId)
    .where('code_id', '=', codeId)
    .orderBy('id')
    .execute();
}

/** By version or id within a code; the version wins where one looks like an id. */
export function findRelease(db: Kysely<DB>, organisationId: string, codeId: string, key: { id: string | null; slug: string }) {
  return db
    .selectFrom('releases')
    .selectAll()
    .where('organisation_id', '=', organisationId)
    .where('code_id', '=', codeId)
    .where((eb) => eb.or([eb('version', '=', key.slug), ...(key.id === null ? [] : [eb('id', '=', key.id)])]))
    .orderBy((eb) => eb('version', '=', key.slug), 'desc')
    .executeTakeFirst();
}

/** Only where the revision is still the one that was read. */
export function updateReleaseState(db: Kysely<DB>, organisationId: string, at: { id: string; revision: number }, state: string) {
  return db
    .updateTable('releases')
    .set({ state, revision: at.revision + 1 })
    .where('organisation_id', '=', organisationId)
    .where('id', '=', at.id)
    .where('revision', '=', at.revision)
    .returningAll()
    .executeTakeFirst();
}

/** By version or id over all codes: several codes may have a release of one version. */
export function listReleasesNamed(db: Kysely<DB>, organisationId: string, key: { id: string | null; slug: string }) {
  return db
    .selectFrom('releases')
    .select('id')
    .where('organisation_id', '=', organisationId)
    .where((eb) => eb.or([eb('version', '=', key.slug), ...(key.id === null ? [] : [eb('id', '=', key.id)])]))
    .execute();
}
