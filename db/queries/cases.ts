import type { InsertObject, Kysely } from 'kysely';
import { json } from '../json';
import type { DB } from '../schema.generated';

/** Cases with their latest revision, their code, and their problem by its latest name. */
function withLatestRevision(db: Kysely<DB>, organisationId: string) {
  return db
    .selectFrom('cases')
    .innerJoin('case_revisions as latest', (join) => join
      .onRef('latest.organisation_id', '=', 'cases.organisation_id')
      .onRef('latest.case_id', '=', 'cases.id')
      .onRef('latest.revision', '=', 'cases.revision'))
    .innerJoin('codes', (join) => join.onRef('codes.organisation_id', '=', 'cases.organisation_id').onRef('codes.id', '=', 'cases.code_id'))
    .innerJoin('problems', (join) => join
      .onRef('problems.organisation_id', '=', 'latest.organisation_id')
      .onRef('problems.id', '=', 'latest.problem_id'))
    .innerJoin('problem_revisions as problem', (join) => join
      .onRef('problem.organisation_id', '=', 'problems.organisation_id')
      .onRef('problem.problem_id', '=', 'problems.id')
      .onRef('problem.revision', '=', 'problems.revision'))
    .innerJoin('users as changer', 'changer.id', 'latest.created_by')
    .select([
      'cases.id', 'cases.slug', 'cases.kind', 'cases.revision', 'cases.columns', 'cases.created_at', 'latest.name', 'latest.definition',
      'latest.created_at as changed_at', 'changer.email as changed_by', 'cases.code_id', 'codes.slug as code_slug', 'codes.name as code_name', 'latest.problem_id',
      'problems.slug as problem_slug', 'problem.name as problem_name', 'problem.definition as problem_definition',
    ])
    .where('cases.organisation_id', '=', organisationId);
}

export type CaseRow = Awaited<ReturnType<typeof listCases>>[number];

interface Page { after: string | null; limit: number; codeId: string | null; problemId: string | null }

export function listCases(db: Kysely<DB>, organisationId: string, page: Page) {
  return withLatestRevision(db, organisationId)
    .$if(page.after !== null, (query) => query.where('cases.id', '<', page.after as string))
    .$if(page.codeId !== null, (query) => query.where('cases.code_id', '=', page.codeId as string))
    .$if(page.problemId !== null, (query) => query.where('latest.problem_id', '=', page.problemId as string))
    .orderBy('cases.id', 'desc')
    .limit(page.limit)
    .execute();
}

/** By id or slug. */
export function findCase(db: Kysely<DB>, organisationId: string, key: { id: string | null; slug: string }): Promise<CaseRow | undefined> {
  return withLatestRevision(db, organisationId)
    .where((eb) => eb.or([eb('cases.slug', '=', key.slug), ...(key.id === null ? [] : [eb('cases.id', '=', key.id)])]))
    .executeTakeFirst();
}

/** All cases of a code, oldest first. */
export function listCasesOfCode(db: Kysely<DB>, organisationId: string, codeId: string): Promise<CaseRow[]> {
  return withLatestRevision(db, organisationId).where('cases.code_id', '=', codeId).orderBy('cases.id').execute();
}

/** All cases whose latest revision is on one of the problems; of one code only where one is named. */
export async function listCasesOnProblems(db: Kysely<DB>, organisationId: string, problemIds: readonly string[], onlyCodeId: string | null): Promise<CaseRow[]> {
  if (problemIds.length === 0) return [];
  return withLatestRevision(db, organisationId)
    .where('latest.problem_id', 'in', problemIds)
    .$if(onlyCodeId !== null, (query) => query.where('cases.code_id', '=', onlyCodeId as string))
    .orderBy('cases.id')
    .execute();
}

export function insertCase(db: Kysely<DB>, row: InsertObject<DB, 'cases'>) {
  return db.insertInto('cases').values(row).execute();
}

export function insertCaseRevision(db: Kysely<DB>, row: InsertObject<DB, 'case_revisions'>) {
  return db.insertInto('case_revisions').values(row).execute();
}

/** True where the revision was still the one that was read; it is the next one then. */
export async function raiseCaseRevision(db: Kysely<DB>, organisationId: string, at: { id: string; revision: number }): Promise<boolean> {
  const result = await db
    .updateTable('cases')
    .set({ revision: at.revision + 1 })
    .where('organisation_id', '=', organisationId)
    .where('id', '=', at.id)
    .where('revision', '=', at.revision)
    .executeTakeFirst();
  return result.numUpdatedRows > 0n;
}

export function updateCaseColumns(db: Kysely<DB>, organisationId: string, id: string, columns: unknown) {
  return db
    .updateTable('cases')
    .set({ columns: json(columns) })
    .where('organisation_id', '=', organisationId)
    .where('id', '=', id)
    .execute();
}

/** The mapping as it stands, which nobody changes until the transaction ends. */
export async function lockCaseColumns(db: Kysely<DB>, organisationId: string, id: string) {
  const row = await db
    .selectFrom('cases')
    .select('columns')
    .where('organisation_id', '=', organisationId)
    .where('id', '=', id)
    .forShare()
    .executeTakeFirstOrThrow();
  return row.columns;
}
