import type { ProblemDefinition } from '../problems/schema';
import type { DeclaredField } from './definition';

/** Fields that nothing exact is known of: files of successive grids are compared with each other. */
export function solutionFields({ fields }: { fields: readonly DeclaredField[] }, { exact = {} }: Pick<ProblemDefinition, 'exact'>): string[] {
  return fields.flatMap(({ field, compare }) => (compare === undefined && !Object.hasOwn(exact, field) ? [field] : []));
}
