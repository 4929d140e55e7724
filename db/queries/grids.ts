import { sql, type InsertObject, type Kysely, type UpdateObject } from 'kysely';
import type { DB } from '../schema.generated';
import type { RevisionKey } from './study-revisions';

export function insertGrids(db: Kysely<DB>, rows: InsertObject<DB, 'grids'>[]) {
  return db.insertInto('grids').values(rows).execute();
}

/** Grids of a revision in the order they were made, each with its file and what was read from it. */
export function listGrids(db: Kysely<DB>, at: RevisionKey) {
  return db
    .selectFrom('grids')
    .leftJoin('uploads', (join) => join.onRef('uploads.organisation_id', '=', 'grids.organisation_id').onRef('uploads.id', '=', 'grids.upload_id'))
    .leftJoin('users as sender', 'sender.id', 'uploads.created_by')
    .leftJoin('grid_results as result', (join) => join
      .onRef('result.organisation_id', '=', 'grids.organisation_id').onRef('result.grid_id', '=', 'grids.id').onRef('result.upload_id', '=', 'grids.upload_id'))
    .selectAll('grids')
    .select([
      'uploads.filename', 'uploads.bytes', 'uploads.sha256', 'uploads.created_at as sent_at', 'sender.email as sender', 'result.norms', 'result.mapping', 'result.numerics_version',
    ])
    .where('grids.organisation_id', '=', at.organisationId)
    .where('grids.study_id', '=', at.studyId)
    .where('grids.study_revision', '=', at.revision)
    .orderBy('grids.id')
    .execute();
}
export type GridRow = Awaited<ReturnType<typeof listGrids>>[number];

export function findGrid(db: Kysely<DB>, organisationId: string, id: string) {
  return db.selectFrom('grids').selectAll().where('organisation_id', '=', organisationId).where('id', '=', id).executeTakeFirst();
}

/** The grid of the study's current revision that names the upload. */
export function findGridOfUpload(db: Kysely<DB>, organisationId: string, uploadId: string) {
  return db
    .selectFrom('grids')
    .innerJoin('studies', (join) => join.onRef('studies.organisation_id', '=', 'grids.organisation_id').onRef('studies.id', '=', 'grids.study_id'))
    .selectAll('grids')
    .where('grids.organisation_id', '=', organisationId)
    .where('grids.upload_id', '=', uploadId)
    .orderBy((eb) => eb('grids.study_revision', '=', eb.ref('studies.revision')), 'desc')
    .orderBy('grids.study_revision', 'desc')
    .executeTakeFirst();
}

interface GridCondition { states?: string[]; uploadId?: string; revision?: number }

/** Changes a grid only where it is as the caller saw it; whether it was. */
export async function updateGrid(db: Kysely<DB>, organisationId: string, id: string, changes: UpdateObject<DB, 'grids'>, only: GridCondition = {}): Promise<boolean> {
  const changed = await db
    .updateTable('grids')
    .set(changes)
    .where('organisation_id', '=', organisationId)
    .where('id', '=', id)
    .$if(only.states !== undefined, (query) => query.where('state', 'in', only.states as string[]))
    .$if(only.uploadId !== undefined, (query) => query.where('upload_id', '=', only.uploadId as string))
    .$if(only.revision !== undefined, (query) => query.where('revision', '=', only.revision as number))
    .executeTakeFirst();
  return changed.numUpdatedRows > 0n;
}

/** Grids that still stand between the revision and its assessment, and how many take part in it. */
export function countGrids(db: Kysely<DB>, at: RevisionKey) {
  return db
    .selectFrom('grids')
    .select([
      sql<number>`count(*) filter (where excluded is null and state in ('read', 'typed'))::int`.as('ready'),
      sql<number>`count(*) filter (where excluded is null and state not in ('read', 'typed'))::int`.as('open'),
    ])
    .where('organisation_id', '=', at.organisationId)
    .where('study_id', '=', at.studyId)
    .where('study_revision', '=', at.revision)
    .executeTakeFirstOrThrow();
}
