import { json } from '@/db/json';
import { insertProblem, insertProblemRevision } from '@/db/queries/problems';
import { slugFrom } from '@/lib/domain/api/names';
import type { CreateProblemInput, Problem } from '@/lib/domain/problems/schema';
import type { MemberContext } from '../context';
import { newId } from '../keys';
import { refuseDuplicate } from '../unique-violation';
import { withOrganisation } from '../with-organisation';
import { checkProblemDefinition } from './check-definition';
import { mapProblem } from './map-problem';
import { permitProblemWrite } from './permit-problem-write';
import { requireProblem } from './require-problem';

export async function createProblem(ctx: MemberContext, input: CreateProblemInput): Promise<Problem> {
  permitProblemWrite(ctx);
  const { name, slug = slugFrom(name), ...definition } = input;
  checkProblemDefinition(definition);
  const at = { organisation_id: ctx.organisation.id, created_by: ctx.userId };
  const id = newId();
  return refuseDuplicate('problems_slug_key', 'slug', `A problem with the short name “${slug}” is already there. Choose another.`, () =>
    withOrganisation(ctx, async (trx) => {
      await insertProblem(trx, { ...at, id, slug });
      await insertProblemRevision(trx, { ...at, problem_id: id, revision: 1, name, definition: json(definition) });
      return mapProblem(await requireProblem(ctx, trx, id), []);
    }),
  );
}
