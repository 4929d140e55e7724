import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import { takesFiles } from '@/lib/domain/studies/takes-files';
import { AppError } from '@/lib/errors';
import type { LoadedStudy } from '../studies/require-study';

/** A file holds the fields of the case: where it declares none there is nothing to send one for. */
export function requireFields({ bound }: LoadedStudy): void {
  if (takesFiles(caseDefinitionSchema.parse(bound.case_definition))) return;
  throw new AppError('invalid', 'The case declares no field, so no file can be compared. Type the values of its quantities instead.');
}
