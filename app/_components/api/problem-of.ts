import type { FieldProblem } from '@/lib/errors';
import { ApiProblem } from './api-problem';

interface ShownProblem { title: string; detail: string; errors: readonly FieldProblem[] }

/** What to tell of a call that did not succeed: what the server said, or that it did not answer. Null where nothing is wrong. */
export function problemOf(error: unknown, title: string): ShownProblem | null {
  if (error === null || error === undefined) return null;
  if (error instanceof ApiProblem) return error.problem;
  return { title, detail: 'The server did not answer. Try again in a moment.', errors: [] };
}
