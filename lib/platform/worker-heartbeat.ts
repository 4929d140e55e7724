import type { Redis } from 'ioredis';
import type { Logger } from './logger';

const key = 'worker.seen';
const everyMilliseconds = 10_000;
/** Three beats missed: no worker is there. */
const lifeSeconds = 30;

/** Says every few seconds that a worker is there; returns what ends it. */
export function startHeartbeat(redis: Redis, log: Logger): () => void {
  const beat = () => {
    redis.set(key, '1', 'EX', lifeSeconds).catch((error: unknown) => log.debug({ fault: String(error) }, 'heartbeat'));
  };
  beat();
  const timer = setInterval(beat, everyMilliseconds);
  return () => clearInterval(timer);
}

/** Whether any worker was there within half a minute; null where the queue cannot be asked. */
export function createWorkerWatch(redis: Redis): () => Promise<boolean | null> {
  return () => redis.exists(key).then((count) => count > 0, () => null);
}
