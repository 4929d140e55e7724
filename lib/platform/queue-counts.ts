import { Queue } from 'bullmq';
import type { Redis } from 'ioredis';
import { queueName } from '@/lib/jobs/jobs';
import type { Logger } from './logger';

/** How many jobs wait, run and are put off, as the queue says. */
export function createQueueCounts(redis: Redis, log: Logger): () => Promise<Record<string, number>> {
  let queue: Queue | undefined;
  return () => {
    if (!queue) {
      queue = new Queue(queueName, { connection: redis, skipMetasUpdate: true });
      queue.on('error', (error) => log.warn({ fault: error.message }, 'queue'));
    }
    return queue.getJobCounts('wait', 'active', 'delayed');
  };
}
