import type { CaseRow } from '@/db/queries/cases';
import type { ProblemRow } from '@/db/queries/problems';
import { problemDefinitionSchema, type Problem } from '@/lib/domain/problems/schema';

/** `cases` are those on any of the problems being mapped. */
export function mapProblem(row: ProblemRow, cases: readonly CaseRow[]): Problem {
  return {
    ...problemDefinitionSchema.parse(row.definition),
    id: row.id, slug: row.slug, name: row.name, revision: row.revision,
    createdAt: row.created_at.toISOString(), changedAt: row.changed_at.toISOString(), changedBy: row.changed_by,
    usedBy: cases.filter((each) => each.problem_id === row.id).map(({ id, slug, name }) => ({ id, slug, name })),
  };
}
