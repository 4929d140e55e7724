import type { NotAvailableYet } from '../api/not-yet';
import type { ProblemDefinition } from './schema';

/** The first member that asks for what is not available yet. */
export function notYetOfProblem(definition: ProblemDefinition): NotAvailableYet | null {
  if (definition.equation === 'custom') return { path: 'equation', what: 'An equation of your own' };
  if (definition.residual !== undefined) return { path: 'residual', what: 'A residual of your own' };
  return null;
}
