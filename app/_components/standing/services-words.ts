import { ApiProblem } from '../api/api-problem';

/** What of Fourfold does not answer. */
export type Missing = 'server' | 'database' | 'queue' | 'storage';

/** Of the answer of `ready`: an error that is no answer at all means the server itself. */
export function missingOf(error: unknown): readonly Missing[] {
  if (!(error instanceof ApiProblem)) return ['server'];
  const named = (['database', 'queue', 'storage'] as const).filter((name) => error.problem.errors.some(({ path }) => path === name));
  return named.length === 0 ? ['server'] : named;
}

/** What does not work now and what does, one sentence for each service. */
export const missingWords: Record<Missing, { title: string; text: string }> = {
  server: { title: 'The server does not answer.', text: 'Nothing can be read or saved until it is back.' },
  database: { title: 'The database does not answer.', text: 'Nothing can be read or saved until it is back.' },
  queue: {
    title: 'The queue does not answer.',
    text: 'Studies can be read and changed, and files can be sent; files are read, and outcomes come, once it is back. Nobody can sign in meanwhile.',
  },
  storage: { title: 'Storage does not answer.', text: 'Studies can be read and values typed; files can be neither sent nor read until it is back.' },
};
