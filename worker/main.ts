import os from 'node:os';
import { Queue } from 'bullmq';
import { readEnv } from '@/lib/env';
import { queueName, type JobPayload } from '@/lib/jobs/jobs';
import { startHeartbeat } from '@/lib/platform/worker-heartbeat';
import { createThreadPool } from './compute/thread-pool';
import { createThreadReader } from './compute/thread-reader';
import { openWorkerContext } from './context';
import { createDispatcher } from './outbox/dispatcher';
import { listenToOutbox } from './outbox/listener';
import { watchQueue } from './outbox/queue-watch';
import { serveMetrics } from './metrics-server';
import { createQueueWorker } from './queue-worker';
import { startSweeps } from './schedules/sweeps';
import { createWorkerMetrics } from './worker-metrics';

const sweepEveryMilliseconds = 60_000;
/** Rows that failed become due with nobody to say so. */
const dispatchEveryMilliseconds = 5000;
/** The supervisor kills what has not ended ten seconds after it was asked to. */
const finishWithinMilliseconds = 7000;

const env = readEnv(process.env);
const connections = openWorkerContext(env);
const { context, log, redis, adding, openListener } = connections;
const threads = env.WORKER_THREADS ?? os.availableParallelism();
const pool = createThreadPool(threads, { memoryMb: env.READ_MEMORY_MB, silenceSeconds: 4 * env.READ_STALL_SECONDS });
const metrics = createWorkerMetrics(connections.pool);
// The queue sends its first command as it is made; on a connection that is not ready that fails for good.
if (adding.status !== 'ready') await new Promise<void>((resolve) => adding.once('ready', resolve));
const queue = new Queue<JobPayload>(queueName, { connection: adding });
queue.on('error', (error) => log.warn({ fault: error.message }, 'queue'));

const dispatcher = createDispatcher(context, queue);
// More jobs than threads, so that assessments pass by files that wait for one.
const worker = createQueueWorker(context, redis, { reader: metrics.counting(createThreadReader(pool)), metrics, concurrency: threads + 2 });
const stopListening = listenToOutbox(openListener, log, () => dispatcher.dispatch());
const stopWatching = watchQueue(adding, log, () => dispatcher.sweep());
dispatcher.sweep();
const schedules = [setInterval(() => dispatcher.sweep(), sweepEveryMilliseconds), setInterval(() => dispatcher.dispatch(), dispatchEveryMilliseconds)];
const stopSweeps = startSweeps(context);
const stopHeartbeat = startHeartbeat(adding, log);
const stopServing = env.METRICS_PORT === undefined ? () => undefined : serveMetrics(metrics.registry, { port: env.METRICS_PORT, token: env.METRICS_TOKEN, log });
log.info({ threads }, 'worker ready');

let isStopping = false;

/** Lets running jobs end; what takes longer is left to the next worker, which finds it unfinished within seconds. */
async function stop(signal: string): Promise<void> {
  if (isStopping) return;
  isStopping = true;
  log.info({ signal }, 'worker stopping');
  schedules.forEach((schedule) => clearInterval(schedule));
  stopWatching();
  stopHeartbeat();
  stopServing();
  await Promise.all([stopListening(), dispatcher.close()]);
  const swept = stopSweeps();
  const late = new Promise<'late'>((resolve) => setTimeout(resolve, finishWithinMilliseconds, 'late'));
  const ended = Promise.all([worker.close(), swept]).then(() => 'ended' as const);
  const isLate = (await Promise.race([ended, late])) === 'late';
  if (isLate) {
    log.warn({}, 'jobs left unfinished for the next worker');
    process.exit(0);
  }
  await queue.close();
  await pool.close();
  await connections.close();
  process.exit(0);
}

process.on('SIGTERM', () => void stop('SIGTERM'));
process.on('SIGINT', () => void stop('SIGINT'));
