import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { takesFiles } from '@/lib/domain/studies/takes-files';
import { AppError } from '@/lib/errors';
import type { LoadedStudy } from '../studies/require-study';

/** A file is compared with the exact fields of the problem: where there is none there is nothing to send one for. */
export function requireFields({ bound }: LoadedStudy): void {
  const definition = caseDefinitionSchema.parse(bound.case_definition);
  if (takesFiles(definition, problemDefinitionSchema.parse(bound.problem_definition))) return;
  throw new AppError('invalid', definition.fields.length === 0
    ? 'The case declares no field, so no file can be compared. Type the values of its quantities instead.'
    : 'The problem has no exact solution, so no file can be compared with it. Type the errors of the fields instead.');
}
