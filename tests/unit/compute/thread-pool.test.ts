import { afterEach, describe, expect, it } from 'vitest';
import { RejectedFile } from '@/lib/readers/rejected-file';
import { createThreadPool, type ThreadPool } from '@/worker/compute/thread-pool';

/** A thread that does to its task what the key of the file says. */
const thread = new URL(`data:text/javascript,${encodeURIComponent(`
  import { parentPort } from 'node:worker_threads';
  parentPort.on('message', ({ storageKey }) => {
    const held = [];
    if (storageKey === 'greedy') for (;;) held.push({ text: 'x'.repeat(10) + held.length });
    if (storageKey === 'circling') for (;;);
    if (storageKey === 'dying') process.exit(1);
    if (storageKey === 'throwing') throw new Error('Not caught.');
    const telling = storageKey === 'slow' ? setInterval(() => parentPort.postMessage({ type: 'alive' }), 100) : undefined;
    setTimeout(() => {
      clearInterval(telling);
      parentPort.postMessage({ type: 'done', result: { kind: 'preview', preview: storageKey } });
    }, storageKey === 'slow' ? 1500 : 0);
  });
`)}`);

let pool: ThreadPool;
const open = (size: number, silenceSeconds = 20) => {
  pool = createThreadPool(size, { memoryMb: 32, silenceSeconds }, thread);
  return (storageKey: string) => pool.run({ kind: 'preview', storageKey, given: {} });
};
const done = (storageKey: string) => ({ kind: 'preview', preview: storageKey });
afterEach(() => pool.close());

describe('createThreadPool(size, limits)', () => {
  it('rejects the file for which a thread runs out of memory, and reads the others', async () => {
    const run = open(2);
    const [greedy, ...others] = await Promise.allSettled(['greedy', 'slow', 'b', 'c'].map(run));
    expect(greedy).toMatchObject({ reason: { reasons: [{ code: 'too-much-memory', found: 'more than 32 MB of memory' }] } });
    expect(greedy?.status === 'rejected' && greedy.reason).toBeInstanceOf(RejectedFile);
    expect(others).toMatchObject(['slow', 'b', 'c'].map((key) => ({ value: done(key) })));
  });

  it('ends a thread that says nothing for the time allowed, and not one that says it is alive', async () => {
    const run = open(2, 1);
    const [circling, slow] = await Promise.allSettled([run('circling'), run('slow')]);
    expect(circling).toMatchObject({ reason: { message: 'The thread said nothing for 1 s while it was reading, and was ended.' } });
    expect(slow).toMatchObject({ value: done('slow') });
  });

  it('goes on after a thread that ended or threw', async () => {
    const run = open(1);
    const [dying, throwing, next] = await Promise.allSettled([run('dying'), run('throwing'), run('next')]);
    expect(dying).toMatchObject({ reason: { message: 'The thread ended while it was reading.' } });
    expect(throwing).toMatchObject({ reason: { message: 'Not caught.' } });
    expect(next).toMatchObject({ value: done('next') });
  });
});
