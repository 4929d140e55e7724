import { parentPort } from 'node:worker_threads';
import { readEnv } from '@/lib/env';
import { createStorage } from '@/lib/platform/storage';
import { storageOptionsOf } from '@/lib/platform/storage-options';
import { readDifference } from '@/lib/readers/read-difference';
import { readGrid } from '@/lib/readers/read-grid';
import { readPreview } from '@/lib/readers/read-preview';
import { RejectedFile } from '@/lib/readers/rejected-file';
import type { ReadProgress } from '@/lib/readers/source';
import { createComputeLimit } from './compute-limit';
import { steadySource } from './steady-source';
import { openTableHelper } from './table-helper';
import type { GivenTask, ThreadMessage, ThreadResult } from './thread-messages';
import { wholeFile } from './whole-file';

const toldEveryMilliseconds = 200;
const aliveEveryMilliseconds = 1000;

if (!parentPort) throw new Error('read-grid-thread runs as a worker thread only.');
const port = parentPort;
const env = readEnv(process.env);
const storage = createStorage(storageOptionsOf(env));
const tell = (message: ThreadMessage) => port.postMessage(message);

/** Does it at most so often. */
function sparingly<Parts extends unknown[]>(milliseconds: number, tellOf: (...parts: Parts) => void): (...parts: Parts) => void {
  let toldAt = 0;
  return (...parts) => {
    if (Date.now() - toldAt < milliseconds) return;
    toldAt = Date.now();
    tellOf(...parts);
  };
}

function open(storageKey: string) {
  return steadySource({
    open: (signal) => storage.read(storageKey, signal), stallSeconds: env.READ_STALL_SECONDS,
    onPiece: sparingly(aliveEveryMilliseconds, () => tell({ type: 'alive' })),
  });
}

async function run(task: GivenTask): Promise<ThreadResult> {
  if (task.kind === 'preview') return { kind: 'preview', preview: await readPreview(open(task.storageKey), task.given) };
  if (task.kind === 'difference') {
    const [fine, coarse] = [wholeFile(open(task.fine.storageKey), task.fine.bytes), wholeFile(open(task.coarse.storageKey), task.coarse.bytes)];
    const limit = createComputeLimit(env.READ_COMPUTE_SECONDS, task.fine.bytes + task.coarse.bytes);
    return { kind: 'difference', result: await readDifference({ fine, coarse }, task.reading, limit) };
  }
  const openHelper = task.mayHaveHelp ? openTableHelper : undefined;
  const limit = createComputeLimit(env.READ_COMPUTE_SECONDS, task.bytes);
  const tellProgress = sparingly(toldEveryMilliseconds, (progress: ReadProgress) => tell({ type: 'progress', progress }));
  const onProgress = (progress: ReadProgress) => {
    limit(progress);
    tellProgress(progress);
  };
  return { kind: 'read', result: await readGrid(wholeFile(open(task.storageKey), task.bytes), task.reading, { onProgress, openHelper }) };
}

port.on('message', (task: GivenTask) => {
  run(task).then(
    (result) => tell({ type: 'done', result }),
    (error: unknown) => {
      if (error instanceof RejectedFile) tell({ type: 'rejected', reasons: error.reasons });
      else tell({ type: 'failed', message: error instanceof Error ? error.message : String(error) });
    },
  );
});
