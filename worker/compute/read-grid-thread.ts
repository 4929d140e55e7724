import { parentPort } from 'node:worker_threads';
import { readEnv } from '@/lib/env';
import { createStorage } from '@/lib/platform/storage';
import { storageOptionsOf } from '@/lib/platform/storage-options';
import { readGrid } from '@/lib/readers/read-grid';
import { readPreview } from '@/lib/readers/read-preview';
import { RejectedFile } from '@/lib/readers/rejected-file';
import type { ReadProgress } from '@/lib/readers/source';
import { openTableHelper } from './table-helper';
import type { GivenTask, ThreadMessage, ThreadResult } from './thread-messages';
import { wholeFile } from './whole-file';

const toldEveryMilliseconds = 200;

if (!parentPort) throw new Error('read-grid-thread runs as a worker thread only.');
const port = parentPort;
const storage = createStorage(storageOptionsOf(readEnv(process.env)));
const tell = (message: ThreadMessage) => port.postMessage(message);

/** Passes progress on five times a second at most. */
function sparingly(): (progress: ReadProgress) => void {
  let toldAt = 0;
  return (progress) => {
    if (Date.now() - toldAt < toldEveryMilliseconds) return;
    toldAt = Date.now();
    tell({ type: 'progress', progress });
  };
}

async function run(task: GivenTask): Promise<ThreadResult> {
  const source = await storage.read(task.storageKey);
  try {
    if (task.kind === 'preview') return { kind: 'preview', preview: await readPreview(source) };
    const openHelper = task.mayHaveHelp ? openTableHelper : undefined;
    return { kind: 'read', result: await readGrid(wholeFile(source, task.bytes), task.reading, { onProgress: sparingly(), openHelper }) };
  } finally {
    source.destroy();
  }
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
