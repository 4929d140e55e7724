import { sql, type Kysely } from 'kysely';
import type { DB } from '../schema.generated';
import type { RevisionKey } from './study-revisions';

/** Members who made the study or sent files to the revision, and have not ended since. */
export function listStudyPeople(db: Kysely<DB>, { organisationId, studyId, revision }: RevisionKey) {
  return db
    .selectFrom('memberships')
    .innerJoin('users', 'users.id', 'memberships.user_id')
    .select(['users.id', 'users.email'])
    .where('memberships.organisation_id', '=', organisationId)
    .where(sql<boolean>`users.id in (
      select created_by from studies where organisation_id = ${organisationId} and id = ${studyId}
      union select u.created_by from grids g join uploads u on u.organisation_id = g.organisation_id and u.id = g.upload_id
        where g.organisation_id = ${organisationId} and g.study_id = ${studyId} and g.study_revision = ${revision})`)
    .execute();
}
