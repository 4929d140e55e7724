import { Worker, type Job } from 'bullmq';
import type { Redis } from 'ioredis';
import { jobNameSchema, jobPayloadSchema, queueName, type JobPayload } from '@/lib/jobs/jobs';
import { failJob } from '@/lib/services/outbox/fail-job';
import { finishJob } from '@/lib/services/outbox/finish-job';
import type { GridReader } from '@/lib/services/reading/grid-reader';
import type { WorkerContext } from './context';
import { handlers } from './registry';
import type { WorkerMetrics } from './worker-metrics';

export interface Tools { reader: GridReader; metrics: WorkerMetrics }

/** So that a worker killed outright is noticed within seconds. */
const liveness = { lockDuration: 5000, stalledInterval: 3000, maxStalledCount: 2 };

function contextOf(context: WorkerContext, payload: JobPayload) {
  return { ...context, organisation: { id: payload.organisationId ?? '' }, requestId: payload.requestId };
}

/** What a line about a job says: its id in the queue, what it works on, and the request that caused it. */
function lineOf(job: Job<unknown>) {
  const payload = jobPayloadSchema.safeParse(job.data).data;
  return { job: job.name, jobId: job.id, subject: payload?.subjectId, organisation: payload?.organisationId, requestId: payload?.requestId };
}

async function work(context: WorkerContext, job: Job<unknown>, { reader, metrics }: Tools): Promise<void> {
  const name = jobNameSchema.parse(job.name);
  const payload = jobPayloadSchema.parse(job.data);
  const begun = performance.now();
  const milliseconds = () => Math.round(performance.now() - begun);
  try {
    await handlers[name](contextOf(context, payload), payload, { reader });
    await finishJob(context.db, payload.outboxId, context.clock());
  } catch (error) {
    metrics.countJob(name, 'failed', milliseconds());
    throw error;
  }
  metrics.countJob(name, 'done', milliseconds());
  context.log.info({ ...lineOf(job), milliseconds: milliseconds() }, 'job done');
}

async function giveUpFor(context: WorkerContext, job: Job<unknown>, error: Error): Promise<void> {
  const name = jobNameSchema.parse(job.name);
  const payload = jobPayloadSchema.parse(job.data);
  try {
    await failJob(contextOf(context, payload), name, payload, error);
  } catch (fault) {
    // The sweep finds the row queued without a job and queues it again.
    context.log.error({ ...lineOf(job), err: fault }, 'failed job not noted');
  }
}

/** Takes jobs from the queue, several at a time, and marks their outbox rows. */
export function createQueueWorker(context: WorkerContext, connection: Redis, { concurrency, ...tools }: Tools & { concurrency: number }): Worker {
  const worker = new Worker(queueName, (job: Job<unknown>) => work(context, job, tools), { connection, concurrency, ...liveness });
  worker.on('error', (error) => context.log.warn({ fault: error.message }, 'queue'));
  worker.on('failed', (job, error) => {
    context.log.warn({ ...(job ? lineOf(job) : {}), attempt: job?.attemptsMade, err: error }, 'job failed');
    // What is neither tried again nor waiting for it has failed for good.
    if (job && (job.finishedOn !== undefined || job.attemptsMade >= (job.opts.attempts ?? 1))) void giveUpFor(context, job, error);
  });
  return worker;
}
