import type { Redis } from 'ioredis';
import type { Logger } from '@/lib/platform/logger';

const lookEveryMilliseconds = 2000;
/** After a restart Redis may lack its last second: rows of that second count as lost only a little later. */
const againMilliseconds = 2500;
const markKey = 'fourfold.queue-mark';

/** Calls back where the queue may have lost jobs: Redis has come back, or was emptied; the function returned ends it. */
export function watchQueue(redis: Redis, log: Logger, onLoss: () => void): () => void {
  let again: NodeJS.Timeout | undefined;

  const afterRestart = () => {
    onLoss();
    clearTimeout(again);
    again = setTimeout(onLoss, againMilliseconds);
  };

  const look = async () => {
    // Whoever sets the mark anew is the one to look for what went with the old one; once a row is old enough to count.
    if (redis.status !== 'ready' || (await redis.set(markKey, '1', 'NX')) === null) return;
    log.warn({}, 'the queue was empty');
    afterRestart();
  };

  const onReady = () => {
    log.info({}, 'queue connected');
    afterRestart();
  };
  redis.on('ready', onReady);
  const schedule = setInterval(() => {
    look().catch((error: unknown) => log.warn({ fault: error instanceof Error ? error.message : 'unknown' }, 'queue not looked at'));
  }, lookEveryMilliseconds);

  return () => {
    clearInterval(schedule);
    clearTimeout(again);
    redis.off('ready', onReady);
  };
}
