import { Client } from 'pg';
import { openDatabase } from '@/db/client';
import type { Env } from '@/lib/env';
import { createLogger } from '@/lib/platform/logger';
import { createMailer } from '@/lib/platform/mailer';
import { openRedis } from '@/lib/platform/redis';
import { createStorage } from '@/lib/platform/storage';
import { storageOptionsOf } from '@/lib/platform/storage-options';
import { createStudyEvents } from '@/lib/platform/study-events';
import type { MailJobContext } from '@/lib/services/outbox/job-context';

export type WorkerContext = Omit<MailJobContext, 'organisation'>;

/** The connections of this worker process. */
export function openWorkerContext(env: Env) {
  const log = createLogger('worker', env.LOG_LEVEL);
  const { pool, db } = openDatabase(env.DATABASE_URL, (error) => log.warn({ fault: error.message }, 'database connection'));
  const redis = openRedis(env.REDIS_URL, log, { maxRetriesPerRequest: null });
  // Handing over jobs fails at once when Redis is away: the outbox keeps them, and no transaction waits.
  const adding = openRedis(env.REDIS_URL, log, { maxRetriesPerRequest: 1, enableOfflineQueue: false });
  const telling = openRedis(env.REDIS_URL, log, { maxRetriesPerRequest: 1, enableOfflineQueue: false });
  const context: WorkerContext = {
    db, storage: createStorage(storageOptionsOf(env)), events: createStudyEvents(telling, telling), clock: () => new Date(), log,
    mailer: createMailer({ smtpUrl: env.SMTP_URL, from: env.MAIL_FROM }), publicUrl: env.PUBLIC_URL,
  };

  return {
    context, log, redis, adding, pool,
    /** A connection of its own for LISTEN, opened anew by the caller when it breaks. */
    openListener: () => new Client({ connectionString: env.DATABASE_URL }),
    async close(): Promise<void> {
      for (const connection of [redis, adding, telling]) connection.disconnect();
      await pool.end();
    },
  };
}
