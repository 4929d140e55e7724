import type { Variable } from '@/lib/numerics/expression/node';
import type { ProblemDefinition } from './schema';

/** The coordinates of a problem: as many as its dimension, and t where it is unsteady. */
export function variablesOf({ dimension, unsteady }: Pick<ProblemDefinition, 'dimension' | 'unsteady'>): Variable[] {
  const inSpace = (['x', 'y', 'z'] as const).slice(0, dimension);
  return unsteady ? [...inSpace, 't'] : inSpace;
}
