import type { CaseDefinition } from '../cases/definition';
import { solutionFields } from '../cases/solution-fields';
import type { ProblemDefinition } from '../problems/schema';

/** Whether files can be sent for the grids of a case: it has a field, to compare with an exact solution or over the grids. */
export function takesFiles({ fields }: Pick<CaseDefinition, 'fields'>): boolean {
  return fields.length > 0;
}

/** Whether the weights in a file can tell the spacing of its grid: solutions that are compared stand on the same points. */
export function filesTellSpacing(definition: Pick<CaseDefinition, 'fields'>, problem: Pick<ProblemDefinition, 'exact'>): boolean {
  return takesFiles(definition) && solutionFields(definition, problem).length === 0;
}
