import 'server-only';
import type { Redis } from 'ioredis';
import type { Pool } from 'pg';
import { openDatabase } from '@/db/client';
import { readEnv, type Env } from '@/lib/env';
import { createLogger } from '@/lib/platform/logger';
import { createQueueCounts } from '@/lib/platform/queue-counts';
import { createRateLimits } from '@/lib/platform/rate-limits';
import { createRequestLimits, type RequestLimits } from '@/lib/platform/request-limits';
import { openRedis } from '@/lib/platform/redis';
import { createSessions, type Sessions } from '@/lib/platform/sessions';
import { createStorage } from '@/lib/platform/storage';
import { storageOptionsOf } from '@/lib/platform/storage-options';
import { createStudyEvents } from '@/lib/platform/study-events';
import { createWorkerWatch } from '@/lib/platform/worker-heartbeat';
import type { Context } from '@/lib/services/context';
import { watchRequests } from './watch-requests';
import { createWebMetrics, type WebMetrics } from './web-metrics';

interface Server {
  env: Env;
  context: Context;
  sessions: Sessions;
  pool: Pool;
  redis: Redis;
  metrics: WebMetrics;
  requests: RequestLimits;
  countQueue: () => Promise<Record<string, number>>;
}

function openServer(): Server {
  const env = readEnv(process.env);
  const log = createLogger('web', env.LOG_LEVEL);
  const { pool, db } = openDatabase(env.DATABASE_URL, (error) => log.warn({ fault: error.message }, 'database connection'), {
    connectionTimeoutMillis: 3000, statement_timeout: 10_000, query_timeout: 12_000,
  });
  // The first request waits for the connection. When Redis is away answers fail within a second, when it hangs within
  // three; the outbox keeps the work.
  const redis = openRedis(env.REDIS_URL, log, {
    maxRetriesPerRequest: 1, commandTimeout: 3000, retryStrategy: (times) => Math.min(times * 50, 400),
  });
  const subscriber = openRedis(env.REDIS_URL, log, { maxRetriesPerRequest: null });
  const context: Context = {
    db,
    storage: createStorage(storageOptionsOf(env)),
    storageQuotaBytes: env.STORAGE_QUOTA_BYTES,
    events: createStudyEvents(redis, subscriber),
    limits: createRateLimits(redis),
    isWorkerSeen: createWorkerWatch(redis),
    clock: () => new Date(),
    log,
  };
  const metrics = createWebMetrics(pool);
  watchRequests(log, metrics);
  const requests = createRequestLimits({ redis, log, aMinute: { token: env.TOKEN_REQUESTS_A_MINUTE, person: env.PERSON_REQUESTS_A_MINUTE } });
  return {
    requests, env, context, sessions: createSessions(pool, env.PUBLIC_URL.startsWith('https:')), pool, redis, metrics, countQueue: createQueueCounts(redis, log),
  };
}

// Kept on globalThis so that a reload in development does not open the connections again.
const held = globalThis as typeof globalThis & { fourfoldServer?: Server };

/** The connections of this web process, opened at the first request. */
export function getServer(): Server {
  held.fourfoldServer ??= openServer();
  return held.fourfoldServer;
}
