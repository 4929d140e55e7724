import { openDatabase } from '@/db/client';
import { readEnv } from '@/lib/env';
import { createLogger } from '@/lib/platform/logger';
import { openRedis } from '@/lib/platform/redis';
import { createStorage } from '@/lib/platform/storage';
import { storageOptionsOf } from '@/lib/platform/storage-options';
import { createStudyEvents } from '@/lib/platform/study-events';
import type { SweepContext } from '@/lib/services/sweeps/sweep-context';

/** What a sweep works with in the worker, at a moment of its own. */
export function openSweeping(clock: () => Date): { ctx: SweepContext; close: () => Promise<void> } {
  const env = readEnv(process.env);
  const log = createLogger('worker', 'error');
  const { pool, db } = openDatabase(env.DATABASE_URL, () => undefined);
  const [telling, hearing] = [openRedis(env.REDIS_URL, log, { maxRetriesPerRequest: 1 }), openRedis(env.REDIS_URL, log, { maxRetriesPerRequest: 1 })];
  return {
    ctx: { db, storage: createStorage(storageOptionsOf(env)), events: createStudyEvents(telling, hearing), clock, log },
    close: async () => {
      for (const connection of [telling, hearing]) connection.disconnect();
      await pool.end();
    },
  };
}
