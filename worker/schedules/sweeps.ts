import { sweep } from '@/lib/services/sweeps/sweep';
import type { WorkerContext } from '../context';

const everyMilliseconds = 15 * 60_000;
/** Not while a worker that just started has jobs to catch up with. */
const firstAfterMilliseconds = 60_000;

/** Puts away every quarter of an hour what nobody needs any more; the function returned ends it. */
export function startSweeps(context: WorkerContext): () => Promise<void> {
  let isOver = false;
  let running = Promise.resolve();
  let timer = setTimeout(begin, firstAfterMilliseconds);

  function begin() {
    running = sweep(context, () => isOver)
      .catch((error: unknown) => context.log.warn({ fault: error instanceof Error ? error.message : 'unknown' }, 'not swept'))
      .then(() => { if (!isOver) timer = setTimeout(begin, everyMilliseconds); });
  }

  return async () => {
    isOver = true;
    clearTimeout(timer);
    await running;
  };
}
