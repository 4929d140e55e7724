import { Worker } from 'node:worker_threads';
import { RejectedFile } from '@/lib/readers/rejected-file';
import type { ReadProgress } from '@/lib/readers/source';
import type { ThreadMessage, ThreadResult, ThreadTask } from './thread-messages';

type OnProgress = (progress: ReadProgress) => void;
/** A thread holds some fifty megabytes; starting one anew takes half a second. */
const idleMilliseconds = 30_000;

interface Waiting { task: ThreadTask; onProgress: OnProgress; resolve: (result: ThreadResult) => void; reject: (error: Error) => void }

export interface ThreadPool {
  run(task: ThreadTask, onProgress?: OnProgress): Promise<ThreadResult>;
  /** Ends the threads; what they were doing fails, and its job runs again elsewhere. */
  close(): Promise<void>;
}

export interface ThreadLimits {
  /** Of what a thread holds beside columns of numbers. */
  memoryMb: number;
  /** A thread that has said nothing for so long is ended: it goes round in circles. */
  silenceSeconds: number;
}

/** Beside the bundled main file, or beside this source. */
function readingThread(): URL {
  const isSource = new URL(import.meta.url).pathname.endsWith('.ts');
  return isSource ? new URL('./read-grid-thread.ts', import.meta.url) : new URL('./compute/read-grid-thread.mjs', import.meta.url);
}

function outOfMemory({ memoryMb }: ThreadLimits): RejectedFile {
  return new RejectedFile([{
    code: 'too-much-memory', count: 1, line: null, column: null, found: `more than ${memoryMb} MB of memory`, expected: 'a file that can be read piece by piece',
  }]);
}

/**
 * Threads that are started when first needed and used again; tasks wait in line for the next free one. What nothing
 * needed for a while ends, and gives its memory back.
 */
export function createThreadPool(size: number, limits: ThreadLimits, file = readingThread()): ThreadPool {
  const idle: Worker[] = [];
  const all = new Set<Worker>();
  const queue: Waiting[] = [];
  let isClosed = false;
  const retirement = setTimeout(() => idle.splice(0).forEach((thread) => void thread.terminate()), idleMilliseconds).unref();

  function next(): void {
    const waiting = queue[0];
    if (!waiting) return;
    const thread = idle.pop() ?? (all.size < size ? start() : undefined);
    if (!thread) return;
    queue.shift();
    give(thread, waiting);
  }

  function start(): Worker {
    const thread = new Worker(file, { resourceLimits: { maxOldGenerationSizeMb: limits.memoryMb } });
    all.add(thread);
    // Between tasks an error ends in the exit below; within one it is heard in `give`.
    thread.on('error', () => undefined);
    thread.on('exit', () => {
      all.delete(thread);
      const at = idle.indexOf(thread);
      if (at >= 0) idle.splice(at, 1);
      if (!isClosed) next();
    });
    return thread;
  }

  function give(thread: Worker, { task, onProgress, resolve, reject }: Waiting): void {
    const silence = setTimeout(() => {
      end(() => reject(new Error(`The thread said nothing for ${limits.silenceSeconds} s while it was reading, and was ended.`)), false);
      void thread.terminate();
    }, limits.silenceSeconds * 1000);
    const end = (settle: () => void, isAlive: boolean) => {
      clearTimeout(silence);
      thread.off('message', onMessage);
      thread.off('error', onError);
      thread.off('exit', onExit);
      if (isAlive) idle.push(thread);
      retirement.refresh();
      settle();
      next();
    };
    const onMessage = (message: ThreadMessage) => {
      silence.refresh();
      if (message.type === 'alive') return;
      if (message.type === 'progress') onProgress(message.progress);
      else if (message.type === 'done') end(() => resolve(message.result), true);
      else if (message.type === 'rejected') end(() => reject(new RejectedFile(message.reasons)), true);
      else end(() => reject(new Error(message.message)), true);
    };
    const onError = (error: Error & { code?: string }) => end(() => reject(error.code === 'ERR_WORKER_OUT_OF_MEMORY' ? outOfMemory(limits) : error), false);
    const onExit = () => end(() => reject(new Error('The thread ended while it was reading.')), false);
    thread.on('message', onMessage);
    thread.once('error', onError);
    thread.once('exit', onExit);
    const isAlone = all.size - idle.length < size;
    thread.postMessage({ ...task, mayHaveHelp: isAlone && queue.length === 0 });
  }

  return {
    run(task, onProgress = () => undefined) {
      if (isClosed) return Promise.reject(new Error('The threads are closed.'));
      return new Promise((resolve, reject) => {
        queue.push({ task, onProgress, resolve, reject });
        next();
      });
    },
    async close() {
      isClosed = true;
      for (const { reject } of queue.splice(0)) reject(new Error('The threads are closed.'));
      await Promise.all([...all].map((thread) => thread.terminate()));
    },
  };
}
