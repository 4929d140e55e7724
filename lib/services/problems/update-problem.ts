import { json } from '@/db/json';
import { listCasesOnProblems } from '@/db/queries/cases';
import { insertProblemRevision, raiseProblemRevision } from '@/db/queries/problems';
import { caseDefinitionSchema, caseKindSchema } from '@/lib/domain/cases/definition';
import { checkCase } from '@/lib/domain/cases/check-case';
import { problemDefinitionSchema, type Problem, type ProblemDefinition, type UpdateProblemInput } from '@/lib/domain/problems/schema';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { staleRevision } from '../stale-revision';
import { withOrganisation } from '../with-organisation';
import { checkProblemDefinition } from './check-definition';
import { mapProblem } from './map-problem';
import { permitProblemWrite } from './permit-problem-write';
import { requireProblem } from './require-problem';

type CaseRows = Awaited<ReturnType<typeof listCasesOnProblems>>;

/** A new revision: members given replace the ones before. */
export async function updateProblem(ctx: MemberContext, key: string, revision: number, input: UpdateProblemInput): Promise<Problem> {
  permitProblemWrite(ctx);
  return withOrganisation(ctx, async (trx) => {
    const row = await requireProblem(ctx, trx, key);
    const { name = row.name, ...changes } = input;
    const definition = { ...problemDefinitionSchema.parse(row.definition), ...changes };
    checkProblemDefinition(definition);
    const cases = await listCasesOnProblems(trx, ctx.organisation.id, [row.id], null);
    refuseToStrand(cases, definition);
    if (!(await raiseProblemRevision(trx, ctx.organisation.id, { id: row.id, revision }))) throw staleRevision('problem', row.revision, revision);
    await insertProblemRevision(trx, {
      organisation_id: ctx.organisation.id, problem_id: row.id, revision: revision + 1, name, definition: json(definition), created_by: ctx.userId,
    });
    return mapProblem(await requireProblem(ctx, trx, row.id), cases);
  });
}

/** A case must stay possible on the problem: a field it is judged by cannot vanish under it. */
function refuseToStrand(cases: CaseRows, definition: ProblemDefinition): void {
  for (const row of cases) {
    const [fault] = checkCase(caseDefinitionSchema.parse(row.definition), definition, caseKindSchema.parse(row.kind));
    if (!fault) continue;
    const detail = `The case “${row.name}” would not stand on this any more. ${fault.path}: ${fault.message}`;
    throw new AppError('wrong-state', detail, { fields: [{ path: 'exact', message: detail }] });
  }
}
