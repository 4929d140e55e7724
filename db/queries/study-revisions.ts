import { sql, type Insertable, type Kysely } from 'kysely';
import type { DB, StudyRevisions } from '../schema.generated';

export interface RevisionKey { organisationId: string; studyId: string; revision: number }

export function insertStudyRevision(db: Kysely<DB>, row: Insertable<StudyRevisions>) {
  return db.insertInto('study_revisions').values(row).execute();
}

/** Held until the transaction ends: every change of grids goes one after the other, so that none overlooks another. */
export function lockStudyRevision(db: Kysely<DB>, at: RevisionKey) {
  return db
    .selectFrom('study_revisions')
    .selectAll()
    .where('organisation_id', '=', at.organisationId)
    .where('study_id', '=', at.studyId)
    .where('revision', '=', at.revision)
    .forUpdate()
    .executeTakeFirst();
}

/** A revision with the case and problem it is bound to: the latest ones until its plan is frozen. */
export function findBoundRevision(db: Kysely<DB>, at: RevisionKey) {
  return db
    .selectFrom('study_revisions as own')
    .innerJoin('cases', (join) => join.onRef('cases.organisation_id', '=', 'own.organisation_id').onRef('cases.id', '=', 'own.case_id'))
    .innerJoin('case_revisions as bound', (join) => join
      .onRef('bound.organisation_id', '=', 'own.organisation_id').onRef('bound.case_id', '=', 'own.case_id')
      .on('bound.revision', '=', sql<number>`case when own.plan_frozen_at is null then cases.revision else own.case_revision end`))
    .innerJoin('problems', (join) => join.onRef('problems.organisation_id', '=', 'bound.organisation_id').onRef('problems.id', '=', 'bound.problem_id'))
    .innerJoin('problem_revisions as posed', (join) => join
      .onRef('posed.organisation_id', '=', 'problems.organisation_id').onRef('posed.problem_id', '=', 'problems.id')
      .on('posed.revision', '=', sql<number>`case when own.plan_frozen_at is null then problems.revision else own.problem_revision end`))
    .select([
      'own.revision', 'own.state', 'own.state_since', 'own.plan_frozen_at', 'own.failure', 'own.rule_revision', 'own.created_at',
      'bound.revision as case_revision', 'bound.name as case_name', 'bound.definition as case_definition',
      'problems.id as problem_id', 'problems.slug as problem_slug', 'problems.revision as problem_current_revision',
      'posed.revision as problem_revision', 'posed.name as problem_name', 'posed.definition as problem_definition',
      // Data came under other definitions, in an earlier revision of the study.
      sql<boolean>`exists (
        select from study_revisions earlier
        where earlier.organisation_id = own.organisation_id and earlier.study_id = own.study_id and earlier.revision < own.revision
          and earlier.plan_frozen_at is not null
          and (earlier.case_revision, earlier.problem_id, earlier.problem_revision) <> (bound.revision, bound.problem_id, posed.revision)
      )`.as('definition_after_data'),
    ])
    .where('own.organisation_id', '=', at.organisationId)
    .where('own.study_id', '=', at.studyId)
    .where('own.revision', '=', at.revision)
    .executeTakeFirst();
}
export type BoundRevision = NonNullable<Awaited<ReturnType<typeof findBoundRevision>>>;

/** Only from one of the states named; whether it was so. */
export async function updateRevisionState(db: Kysely<DB>, at: RevisionKey, from: string[], to: { state: string; failure?: string | null; since: Date }): Promise<boolean> {
  const changed = await db
    .updateTable('study_revisions')
    .set({ state: to.state, failure: to.failure ?? null, state_since: to.since })
    .where('organisation_id', '=', at.organisationId)
    .where('study_id', '=', at.studyId)
    .where('revision', '=', at.revision)
    .where('state', 'in', from)
    .executeTakeFirst();
  return changed.numUpdatedRows > 0n;
}

export function updateRevisionFailure(db: Kysely<DB>, at: RevisionKey, failure: string | null) {
  return db
    .updateTable('study_revisions')
    .set({ failure })
    .where('organisation_id', '=', at.organisationId)
    .where('study_id', '=', at.studyId)
    .where('revision', '=', at.revision)
    .execute();
}

/** Binds the revision to a case and problem revision for good; nothing where that was done before. */
export function freezeStudyRevision(
  db: Kysely<DB>, at: RevisionKey, binding: { caseRevision: number; problemId: string; problemRevision: number; frozenAt: Date },
) {
  return db
    .updateTable('study_revisions')
    .set({
      plan_frozen_at: binding.frozenAt, case_revision: binding.caseRevision, problem_id: binding.problemId, problem_revision: binding.problemRevision,
    })
    .where('organisation_id', '=', at.organisationId)
    .where('study_id', '=', at.studyId)
    .where('revision', '=', at.revision)
    .where('plan_frozen_at', 'is', null)
    .execute();
}
