import type { InsertObject, Kysely } from 'kysely';
import type { DB } from '../schema.generated';

/** Problems with their latest revision. */
function withLatestRevision(db: Kysely<DB>, organisationId: string) {
  return db
    .selectFrom('problems')
    .innerJoin('problem_revisions as latest', (join) => join
      .onRef('latest.organisation_id', '=', 'problems.organisation_id')
      .onRef('latest.problem_id', '=', 'problems.id')
      .onRef('latest.revision', '=', 'problems.revision'))
    .innerJoin('users as changer', 'changer.id', 'latest.created_by')
    .select(['problems.id', 'problems.slug', 'problems.revision', 'problems.created_at', 'latest.name', 'latest.definition', 'latest.created_at as changed_at', 'changer.email as changed_by'])
    .where('problems.organisation_id', '=', organisationId);
}

export type ProblemRow = Awaited<ReturnType<typeof listProblems>>[number];

export function listProblems(db: Kysely<DB>, organisationId: string, page: { after: string | null; limit: number }) {
  return withLatestRevision(db, organisationId)
    .$if(page.after !== null, (query) => query.where('problems.id', '<', page.after as string))
    .orderBy('problems.id', 'desc')
    .limit(page.limit)
    .execute();
}

/** By id or slug. */
export function findProblem(db: Kysely<DB>, organisationId: string, key: { id: string | null; slug: string }): Promise<ProblemRow | undefined> {
  return withLatestRevision(db, organisationId)
    .where((eb) => eb.or([eb('problems.slug', '=', key.slug), ...(key.id === null ? [] : [eb('problems.id', '=', key.id)])]))
    .executeTakeFirst();
}

export function insertProblem(db: Kysely<DB>, row: InsertObject<DB, 'problems'>) {
  return db.insertInto('problems').values(row).execute();
}

export function insertProblemRevision(db: Kysely<DB>, row: InsertObject<DB, 'problem_revisions'>) {
  return db.insertInto('problem_revisions').values(row).execute();
}

/** True where the revision was still the one that was read; it is the next one then. */
export async function raiseProblemRevision(db: Kysely<DB>, organisationId: string, at: { id: string; revision: number }): Promise<boolean> {
  const result = await db
    .updateTable('problems')
    .set({ revision: at.revision + 1 })
    .where('organisation_id', '=', organisationId)
    .where('id', '=', at.id)
    .where('revision', '=', at.revision)
    .executeTakeFirst();
  return result.numUpdatedRows > 0n;
}
