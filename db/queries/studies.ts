import { sql, type Insertable, type Kysely } from 'kysely';
import type { DB, JsonValue, Studies } from '../schema.generated';

export function insertStudy(db: Kysely<DB>, row: Insertable<Studies>) {
  return db.insertInto('studies').values(row).execute();
}

/** The study with the names it is shown under. */
export function findStudy(db: Kysely<DB>, organisationId: string, id: string) {
  return db
    .selectFrom('studies as study')
    .innerJoin('cases', (join) => join.onRef('cases.organisation_id', '=', 'study.organisation_id').onRef('cases.id', '=', 'study.case_id'))
    .innerJoin('codes', (join) => join.onRef('codes.organisation_id', '=', 'cases.organisation_id').onRef('codes.id', '=', 'cases.code_id'))
    .innerJoin('releases', (join) => join.onRef('releases.organisation_id', '=', 'study.organisation_id').onRef('releases.id', '=', 'study.release_id'))
    .innerJoin('users', 'users.id', 'study.created_by')
    .select([
      'study.id', 'study.case_id', 'study.refinement', 'study.dimension', 'study.revision', 'study.created_at',
      'cases.slug as case_slug', 'cases.kind as case_kind', 'cases.revision as case_current_revision', 'cases.columns as case_columns',
      'codes.id as code_id', 'codes.slug as code_slug', 'codes.name as code_name',
      'releases.id as release_id', 'releases.version as release_version', 'releases.commit as release_commit',
      'users.email as created_by',
    ])
    .where('study.organisation_id', '=', organisationId)
    .where('study.id', '=', id)
    .executeTakeFirst();
}
export type StudyHead = NonNullable<Awaited<ReturnType<typeof findStudy>>>;

interface StudyFilter { caseId: string | null; releaseIds: string[] | null; codeId: string | null; state: string | null }

/** Newest first, each with the state and outcome of its current revision. */
export function listStudies(db: Kysely<DB>, organisationId: string, filter: StudyFilter, page: { after: string | null; limit: number }) {
  return db
    .selectFrom('studies as study')
    .innerJoin('study_revisions as now', (join) => join
      .onRef('now.organisation_id', '=', 'study.organisation_id').onRef('now.study_id', '=', 'study.id').onRef('now.revision', '=', 'study.revision'))
    .innerJoin('cases', (join) => join.onRef('cases.organisation_id', '=', 'study.organisation_id').onRef('cases.id', '=', 'study.case_id'))
    .innerJoin('case_revisions as named', (join) => join
      .onRef('named.organisation_id', '=', 'cases.organisation_id').onRef('named.case_id', '=', 'cases.id').onRef('named.revision', '=', 'cases.revision'))
    .innerJoin('codes', (join) => join.onRef('codes.organisation_id', '=', 'cases.organisation_id').onRef('codes.id', '=', 'cases.code_id'))
    .innerJoin('releases', (join) => join.onRef('releases.organisation_id', '=', 'study.organisation_id').onRef('releases.id', '=', 'study.release_id'))
    .leftJoin('assessments', (join) => join
      .onRef('assessments.organisation_id', '=', 'now.organisation_id').onRef('assessments.study_id', '=', 'now.study_id')
      .onRef('assessments.study_revision', '=', 'now.revision'))
    .select([
      'study.id', 'study.created_at', 'now.state', 'now.revision', 'now.state_since',
      'cases.id as case_id', 'cases.slug as case_slug', 'named.name as case_name',
      'codes.id as code_id', 'codes.slug as code_slug', 'codes.name as code_name',
      'releases.id as release_id', 'releases.version as release_version',
      'assessments.outcome', sql<JsonValue>`assessments.body -> 'reasons'`.as('reasons'),
    ])
    .where('study.organisation_id', '=', organisationId)
    .$if(filter.caseId !== null, (query) => query.where('study.case_id', '=', filter.caseId as string))
    .$if(filter.releaseIds !== null, (query) => query.where('study.release_id', 'in', filter.releaseIds as string[]))
    .$if(filter.codeId !== null, (query) => query.where('cases.code_id', '=', filter.codeId as string))
    .$if(filter.state !== null, (query) => query.where('now.state', '=', filter.state as string))
    .$if(page.after !== null, (query) => query.where('study.id', '<', page.after as string))
    .orderBy('study.id', 'desc')
    .limit(page.limit)
    .execute();
}
export type StudyListRow = Awaited<ReturnType<typeof listStudies>>[number];

/** Makes the next revision the current one, unless somebody did so first. */
export async function advanceStudyRevision(db: Kysely<DB>, organisationId: string, id: string, from: number): Promise<boolean> {
  const changed = await db
    .updateTable('studies')
    .set({ revision: from + 1 })
    .where('organisation_id', '=', organisationId)
    .where('id', '=', id)
    .where('revision', '=', from)
    .executeTakeFirst();
  return changed.numUpdatedRows > 0n;
}
