import { sql } from 'kysely';
import { AppError } from '@/lib/errors';
import type { Context } from '../context';

const patienceMilliseconds = 3000;

/** Refuses with 503, naming every service that does not answer. */
export async function checkReady(ctx: Context, pingQueue: () => Promise<unknown>): Promise<{ database: true; queue: true; storage: true }> {
  const asked = {
    database: () => sql`select 1`.execute(ctx.db),
    queue: pingQueue,
    storage: async () => {
      if (!(await ctx.storage.isReachable())) throw new Error('The bucket is not reachable.');
    },
  };
  const answers = await Promise.all(Object.entries(asked).map(async ([name, ask]) => ({ name, fault: await faultOf(ask) })));
  const missing = answers.filter((answer) => answer.fault !== null);
  if (missing.length === 0) return { database: true, queue: true, storage: true };
  for (const { name, fault } of missing) ctx.log.warn({ service: name, fault }, 'not ready');
  throw new AppError('unavailable', `Not reachable: ${missing.map((answer) => answer.name).join(', ')}.`, {
    fields: missing.map(({ name }) => ({ path: name, message: 'Not reachable.' })),
  });
}

function faultOf(ask: () => Promise<unknown>): Promise<string | null> {
  return new Promise((resolve) => {
    const timer = setTimeout(() => resolve('No answer in time.'), patienceMilliseconds);
    ask().then(() => resolve(null), (error: unknown) => resolve(error instanceof Error ? error.message : String(error))).finally(() => clearTimeout(timer));
  });
}
