import type { Queue } from 'bullmq';
import type { JobPayload } from '@/lib/jobs/jobs';
import { dispatchJobs } from '@/lib/services/outbox/dispatch-jobs';
import { requeueLostJobs } from '@/lib/services/outbox/requeue-lost-jobs';
import type { WorkerContext } from '../context';

const jobOptions = {
  attempts: 5, backoff: { type: 'exponential', delay: 1000 },
  // A job kept under its id would swallow the next of that id without a sign.
  removeOnComplete: true, removeOnFail: true,
} as const;

export interface Dispatcher {
  /** Hands over what waits; while it runs, one more call is remembered, not more. */
  dispatch(): void;
  /** Looks for jobs the queue has lost, then hands over what waits. */
  sweep(): void;
  /** Resolves when what runs has ended; nothing begins after. */
  close(): Promise<void>;
}

/** Turns outbox rows into jobs. A fault, as of a queue that is away, is logged: the rows wait for the next call. */
export function createDispatcher({ db, clock, log }: WorkerContext, queue: Queue<JobPayload>): Dispatcher {
  let running: Promise<void> | null = null;
  let isWanted = false;
  let isSweepWanted = false;
  let isClosed = false;

  const isAlive = async (jobId: string): Promise<boolean> => {
    const job = await queue.getJob(jobId);
    return job !== undefined && !['completed', 'failed', 'unknown'].includes(await job.getState());
  };

  const add = async (jobs: Parameters<Parameters<typeof dispatchJobs>[2]>[0]) => {
    await queue.addBulk(jobs.map(({ id, name, payload }) => ({ name, data: payload, opts: { ...jobOptions, jobId: id } })));
  };

  const work = async () => {
    while (isWanted && !isClosed) {
      isWanted = false;
      try {
        if (isSweepWanted) {
          isSweepWanted = false;
          const lost = await requeueLostJobs(db, clock(), isAlive);
          if (lost > 0) log.warn({ lost }, 'jobs the queue had lost are queued again');
        }
        while ((await dispatchJobs(db, clock(), add)) > 0);
      } catch (error) {
        log.warn({ fault: error instanceof Error ? error.message : 'unknown' }, 'outbox not handed over');
      }
    }
    running = null;
  };

  const wake = () => {
    isWanted = true;
    running ??= work();
  };

  return {
    dispatch: wake,
    sweep() {
      isSweepWanted = true;
      wake();
    },
    async close() {
      isClosed = true;
      await running;
    },
  };
}
