import { sql, type Kysely } from 'kysely';
import type { DB } from '../schema.generated';

/** The organisation's own quota, null where it has none; the row is held, so that two cannot take the same room. */
export function lockStorageQuota(db: Kysely<DB>, organisationId: string) {
  return db.selectFrom('organisations').select('storage_quota_bytes').where('id', '=', organisationId).forNoKeyUpdate().executeTakeFirstOrThrow();
}

export function findStorageQuota(db: Kysely<DB>, organisationId: string) {
  return db.selectFrom('organisations').select('storage_quota_bytes').where('id', '=', organisationId).executeTakeFirstOrThrow();
}

/** Bytes of whole files, bytes announced by uploads that are open, and how many those are. */
export function sumStoredBytes(db: Kysely<DB>, organisationId: string, besides: string | null = null) {
  return db
    .selectFrom('uploads')
    .select([
      sql<string>`coalesce(sum(bytes) filter (where state = 'stored'), 0)`.as('stored'),
      sql<string>`coalesce(sum(bytes) filter (where state = 'receiving'), 0)`.as('announced'),
      sql<number>`count(*) filter (where state = 'receiving')::int`.as('open'),
    ])
    .where('organisation_id', '=', organisationId)
    .$if(besides !== null, (query) => query.where('id', '!=', besides as string))
    .executeTakeFirstOrThrow();
}

/** Studies by what their files take, largest first. */
export function listStudiesByBytes(db: Kysely<DB>, organisationId: string, filter: { codeId: string | null; limit: number }) {
  return db
    .selectFrom('uploads')
    .innerJoin('grids', (join) => join.onRef('grids.organisation_id', '=', 'uploads.organisation_id').onRef('grids.id', '=', 'uploads.grid_id'))
    .innerJoin('studies', (join) => join.onRef('studies.organisation_id', '=', 'grids.organisation_id').onRef('studies.id', '=', 'grids.study_id'))
    .innerJoin('cases', (join) => join.onRef('cases.organisation_id', '=', 'studies.organisation_id').onRef('cases.id', '=', 'studies.case_id'))
    .innerJoin('case_revisions as named', (join) => join
      .onRef('named.organisation_id', '=', 'cases.organisation_id').onRef('named.case_id', '=', 'cases.id').onRef('named.revision', '=', 'cases.revision'))
    .innerJoin('codes', (join) => join.onRef('codes.organisation_id', '=', 'cases.organisation_id').onRef('codes.id', '=', 'cases.code_id'))
    .innerJoin('releases', (join) => join.onRef('releases.organisation_id', '=', 'studies.organisation_id').onRef('releases.id', '=', 'studies.release_id'))
    .select(['studies.id', 'named.name as case_name', 'codes.name as code_name', 'releases.version'])
    .select([sql<string>`sum(uploads.bytes)`.as('bytes'), sql<number>`count(*)::int`.as('files')])
    .where('uploads.organisation_id', '=', organisationId)
    .where('uploads.state', '=', 'stored')
    .$if(filter.codeId !== null, (query) => query.where('cases.code_id', '=', filter.codeId as string))
    .groupBy(['studies.id', 'named.name', 'codes.name', 'releases.version'])
    .orderBy(sql`sum(uploads.bytes)`, 'desc')
    .orderBy('studies.id')
    .limit(filter.limit)
    .execute();
}

/** Uploads in parts that are open, oldest first. */
export function listOpenUploads(db: Kysely<DB>, organisationId: string, codeId: string | null) {
  return db
    .selectFrom('uploads')
    .innerJoin('users', 'users.id', 'uploads.created_by')
    .innerJoin('grids', (join) => join.onRef('grids.organisation_id', '=', 'uploads.organisation_id').onRef('grids.id', '=', 'uploads.grid_id'))
    .innerJoin('studies', (join) => join.onRef('studies.organisation_id', '=', 'grids.organisation_id').onRef('studies.id', '=', 'grids.study_id'))
    .innerJoin('cases', (join) => join.onRef('cases.organisation_id', '=', 'studies.organisation_id').onRef('cases.id', '=', 'studies.case_id'))
    .select(['uploads.id', 'grids.study_id', 'grids.label', 'uploads.filename', 'uploads.bytes', 'users.email as sender', 'uploads.created_at', 'uploads.last_activity_at'])
    .where('uploads.organisation_id', '=', organisationId)
    .where('uploads.state', '=', 'receiving')
    .$if(codeId !== null, (query) => query.where('cases.code_id', '=', codeId as string))
    .orderBy('uploads.created_at')
    .limit(200)
    .execute();
}
