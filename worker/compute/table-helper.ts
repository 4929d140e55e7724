import { Worker } from 'node:worker_threads';
import type { GridPart } from '@/lib/readers/grid-task';
import type { ChunkHelper, OpenHelper, SharedRooms } from '@/lib/readers/table/chunk-helping';
import type { ChunkResult, TableTask } from '@/lib/readers/table/table-work';

/** What the helping thread is told: first the task, then chunk after chunk, each of which it answers in order. */
export type HelperMessage = { task: TableTask; shared: SharedRooms } | { room: number; length: number };
export type HelperAnswer = 'ready' | { result: ChunkResult<GridPart> | null } | { failed: string };

interface Waiting { resolve: (answer: HelperAnswer) => void; reject: (error: Error) => void }

/** Beside the bundled thread that it helps, or beside this source. */
function threadFile(): URL {
  const isSource = new URL(import.meta.url).pathname.endsWith('.ts');
  return new URL(isSource ? './read-table-thread.ts' : './read-table-thread.mjs', import.meta.url);
}

/** Starts a thread that reads chunks of a table for this one. */
export function openTableHelper(task: TableTask): OpenHelper<GridPart> {
  return async (shared) => {
    // It allocates little beside its columns.
    const thread = new Worker(threadFile(), { resourceLimits: { maxYoungGenerationSizeMb: 4 } });
    const waiting: Waiting[] = [];
    let ended: Error | null = null;
    const end = (error: Error) => {
      ended ??= error;
      for (const { reject } of waiting.splice(0)) reject(error);
    };
    thread.on('message', (answer: HelperAnswer) => waiting.shift()?.resolve(answer));
    thread.once('error', end);
    thread.once('exit', () => end(new Error('The thread ended while it was helping to read.')));
    const ask = (message: HelperMessage) => new Promise<HelperAnswer>((resolve, reject) => {
      if (ended !== null) {
        reject(ended);
        return;
      }
      waiting.push({ resolve, reject });
      thread.postMessage(message);
    });

    await ask({ task, shared });
    const helper: ChunkHelper<GridPart> = {
      async readAhead(room, length) {
        const answer = await ask({ room, length });
        if (answer === 'ready') throw new Error('The helping thread answered out of order.');
        if ('failed' in answer) throw new Error(answer.failed);
        return answer.result;
      },
      async close() {
        await thread.terminate();
      },
    };
    return helper;
  };
}
