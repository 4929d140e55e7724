import type { Kysely } from 'kysely';
import type { DB } from '../schema.generated';

/** A case by id or slug, with its latest revision and that of its problem: what a study is bound to. */
export function findCaseBinding(db: Kysely<DB>, organisationId: string, key: { id: string | null; slug: string }) {
  return db
    .selectFrom('cases')
    .innerJoin('case_revisions as bound', (join) => join
      .onRef('bound.organisation_id', '=', 'cases.organisation_id').onRef('bound.case_id', '=', 'cases.id').onRef('bound.revision', '=', 'cases.revision'))
    .innerJoin('codes', (join) => join.onRef('codes.organisation_id', '=', 'cases.organisation_id').onRef('codes.id', '=', 'cases.code_id'))
    .innerJoin('problems', (join) => join.onRef('problems.organisation_id', '=', 'bound.organisation_id').onRef('problems.id', '=', 'bound.problem_id'))
    .innerJoin('problem_revisions as posed', (join) => join
      .onRef('posed.organisation_id', '=', 'problems.organisation_id').onRef('posed.problem_id', '=', 'problems.id')
      .onRef('posed.revision', '=', 'problems.revision'))
    .select([
      'cases.id', 'cases.slug', 'cases.revision as case_revision', 'codes.id as code_id', 'codes.slug as code_slug',
      'bound.definition as case_definition',
      'problems.id as problem_id', 'problems.revision as problem_revision', 'posed.definition as problem_definition',
    ])
    .where('cases.organisation_id', '=', organisationId)
    .where((eb) => eb.or([eb('cases.slug', '=', key.slug), ...(key.id === null ? [] : [eb('cases.id', '=', key.id)])]))
    .executeTakeFirst();
}
