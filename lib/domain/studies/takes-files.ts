import type { CaseDefinition } from '../cases/definition';
import type { ProblemDefinition } from '../problems/schema';

/** Whether files can be sent for the grids of a case: it has a field, and its problem an exact solution to compare it with. */
export function takesFiles({ fields }: Pick<CaseDefinition, 'fields'>, { exact }: Pick<ProblemDefinition, 'exact'>): boolean {
  return fields.length > 0 && Object.keys(exact ?? {}).length > 0;
}
