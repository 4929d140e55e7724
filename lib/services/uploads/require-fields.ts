import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import { AppError } from '@/lib/errors';
import type { LoadedStudy } from '../studies/require-study';

/** A file is compared with the fields of the case: where it declares none there is nothing to send one for. */
export function requireFields({ bound }: LoadedStudy): void {
  if (caseDefinitionSchema.parse(bound.case_definition).fields.length > 0) return;
  throw new AppError('invalid', 'The case declares no field, so no file can be compared. Type the values of its quantities instead.');
}
