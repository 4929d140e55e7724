import { json } from '@/db/json';
import { insertCaseRevision, raiseCaseRevision } from '@/db/queries/cases';
import { caseDefinitionSchema, caseKindSchema } from '@/lib/domain/cases/definition';
import type { Case, UpdateCaseInput } from '@/lib/domain/cases/schema';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { requireProblem } from '../problems/require-problem';
import { staleRevision } from '../stale-revision';
import { withOrganisation } from '../with-organisation';
import { checkCaseDefinition } from './check-definition';
import { mapCase } from './map-case';
import { requireCase } from './require-case';

/** A new revision: members given replace the ones before. Its code and kind stay. */
export async function updateCase(ctx: MemberContext, key: string, revision: number, input: UpdateCaseInput): Promise<Case> {
  permit(ctx, 'work.write');
  return withOrganisation(ctx, async (trx) => {
    const row = await requireCase(ctx, trx, key);
    const { name = row.name, problem: problemKey = row.problem_id, elements, ...changes } = input;
    const problem = await requireProblem(ctx, trx, problemKey);
    const definition = { ...caseDefinitionSchema.parse(row.definition), ...changes, ...(elements !== undefined && { elements: elements ?? undefined }) };
    checkCaseDefinition(definition, caseKindSchema.parse(row.kind), problem.definition);
    if (!(await raiseCaseRevision(trx, ctx.organisation.id, { id: row.id, revision }))) throw staleRevision('case', row.revision, revision);
    await insertCaseRevision(trx, {
      organisation_id: ctx.organisation.id, case_id: row.id, revision: revision + 1, name, problem_id: problem.id, definition: json(definition),
      created_by: ctx.userId,
    });
    return mapCase(await requireCase(ctx, trx, row.id));
  });
}
