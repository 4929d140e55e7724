import type { FieldProblem } from '@/lib/errors';
import { ApiProblem } from './api-problem';

interface ShownProblem { title: string; detail: string; errors: readonly FieldProblem[] }

/** What to tell of a call that did not succeed: what the server said, or that it did not answer. Null where nothing is wrong. */
export function problemOf(error: unknown, title: string): ShownProblem | null {
  if (error === null || error === undefined) return null;
  if (error instanceof ApiProblem) {
    if (error.problem.status !== 412) return error.problem;
    // Every such write reads again once it is refused, so what is there now stands on the page already.
    return { ...error.problem, title, detail: 'Somebody else changed it meanwhile. The page shows it as it is now; what you typed is still here. Send it again to put it over theirs.' };
  }
  return { title, detail: 'The server did not answer. Try again in a moment.', errors: [] };
}
