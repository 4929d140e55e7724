import type { InsertObject, Kysely } from 'kysely';
import type { DB } from '../schema.generated';
import type { RevisionKey } from './study-revisions';

/** The first one stays: an assessment never changes. */
export function insertAssessment(db: Kysely<DB>, row: InsertObject<DB, 'assessments'>) {
  return db
    .insertInto('assessments')
    .values(row)
    .onConflict((conflict) => conflict.columns(['organisation_id', 'study_id', 'study_revision']).doNothing())
    .execute();
}

export function findAssessment(db: Kysely<DB>, at: RevisionKey) {
  return db
    .selectFrom('assessments')
    .select(['body'])
    .where('organisation_id', '=', at.organisationId)
    .where('study_id', '=', at.studyId)
    .where('study_revision', '=', at.revision)
    .executeTakeFirst();
}
