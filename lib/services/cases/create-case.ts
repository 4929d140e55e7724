import { json } from '@/db/json';
import { insertCase, insertCaseRevision } from '@/db/queries/cases';
import { slugFrom } from '@/lib/domain/api/names';
import { checkColumns } from '@/lib/domain/cases/check-columns';
import type { Case, CreateCaseInput } from '@/lib/domain/cases/schema';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { requireCode } from '../codes/require-code';
import type { MemberContext } from '../context';
import { newId } from '../keys';
import { permit } from '../permit';
import { requireProblem } from '../problems/require-problem';
import { refuseFaults } from '../refuse';
import { refuseDuplicate } from '../unique-violation';
import { withOrganisation } from '../with-organisation';
import { checkCaseDefinition } from './check-definition';
import { mapCase } from './map-case';
import { requireCase } from './require-case';

export async function createCase(ctx: MemberContext, input: CreateCaseInput): Promise<Case> {
  permit(ctx, 'work.write');
  const { code: codeKey, problem: problemKey, name, slug = slugFrom(name), kind, columns, ...definition } = input;
  const at = { organisation_id: ctx.organisation.id, created_by: ctx.userId };
  const id = newId();
  return refuseDuplicate('cases_slug_key', 'slug', `A case with the short name “${slug}” is already there. Choose another.`, () =>
    withOrganisation(ctx, async (trx) => {
      const code = await requireCode(ctx, trx, codeKey);
      const problem = await requireProblem(ctx, trx, problemKey);
      checkCaseDefinition(definition, kind, problem.definition);
      if (columns) refuseFaults(underColumns(checkColumns(columns, definition, problemDefinitionSchema.parse(problem.definition))));
      await insertCase(trx, { ...at, id, code_id: code.id, slug, kind, columns: columns ? json(columns) : null });
      await insertCaseRevision(trx, { ...at, case_id: id, revision: 1, name, problem_id: problem.id, definition: json(definition) });
      return mapCase(await requireCase(ctx, trx, id));
    }),
  );
}

function underColumns(faults: { path: string; message: string }[]): { path: string; message: string }[] {
  return faults.map(({ path, message }) => ({ path: `columns.${path}`, message }));
}
