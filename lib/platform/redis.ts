import { Redis, type RedisOptions } from 'ioredis';
import type { Logger } from './logger';

/** Faults of the connection go to the log; commands fail by themselves where they must. */
export function openRedis(url: string, log: Logger, options: RedisOptions = {}): Redis {
  const redis = new Redis(url, options);
  redis.on('error', (error: Error) => log.warn({ fault: error.message }, 'redis connection'));
  return redis;
}
