import path from 'node:path';
import { Readable } from 'node:stream';
import { pathToFileURL } from 'node:url';
import { gzipSync } from 'node:zlib';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { readEnv } from '@/lib/env';
import { createStorage } from '@/lib/platform/storage';
import { storageOptionsOf } from '@/lib/platform/storage-options';
import type { GridReading } from '@/lib/readers/grid-reading';
import { ok } from '@/tests/support/api';
import { need } from '@/tests/support/environment';
import { signUp } from '@/tests/support/people';
import { startStallingProxy, type StallingProxy } from '@/tests/support/stalling-proxy';
import { awaitStudy, putFile } from '@/tests/support/study';
import { makeWork } from '@/tests/support/work';
import { createThreadPool, type ThreadPool } from '@/worker/compute/thread-pool';

const storageKey = 'trial/reading-limits/table.csv';
const storage = createStorage(storageOptionsOf(readEnv(process.env)));
const threadFile = pathToFileURL(path.join(need('TEST_BUILD_FOLDER'), 'worker/compute/read-grid-thread.mjs'));
const reading: GridReading = {
  mapping: { x: 'x', y: 'y', weight: 'w', fields: { T: 'T' } }, fields: [{ field: 'T' }],
  problem: { dimension: 2, exact: { T: 'sin(pi*x)*sin(pi*y) + 0.5*x' }, constants: {} },
};
/** Many short rows, no two at one place. */
const table = Buffer.from(`x,y,w,T\n${Array.from({ length: 100_000 }, (_, row) => `${row / 1e6},1,1,1`).join('\n')}\n`);
const task = { kind: 'read', storageKey, bytes: table.length, reading } as const;
const before = { ...process.env };
let proxy: StallingProxy;
let pool: ThreadPool;

beforeAll(async () => {
  proxy = await startStallingProxy(need('STORAGE_ENDPOINT'));
  await storage.put(storageKey, Readable.from([table]));
  // Threads take the environment of this process.
  Object.assign(process.env, { STORAGE_ENDPOINT: proxy.url, READ_STALL_SECONDS: '1', READ_COMPUTE_SECONDS: '1' });
  pool = createThreadPool(1, { memoryMb: 256, silenceSeconds: 10 }, threadFile);
});
afterAll(async () => {
  await pool.close();
  Object.assign(process.env, { STORAGE_ENDPOINT: before.STORAGE_ENDPOINT, READ_STALL_SECONDS: before.READ_STALL_SECONDS ?? '', READ_COMPUTE_SECONDS: before.READ_COMPUTE_SECONDS ?? '' });
  proxy.close();
  await storage.remove(storageKey);
});

describe('a reading', () => {
  it('is given up where storage sends nothing for a while, at the beginning or midway, and works again after', async () => {
    for (const bytes of [0, 200_000]) {
      proxy.stallAfter(bytes);
      const begun = performance.now();
      await expect(pool.run(task)).rejects.toThrow(/^Storage sent nothing for 1 s after \d+ bytes of the file\.$/);
      expect(performance.now() - begun).toBeLessThan(5000);
    }
    proxy.stallAfter(null);
    expect(await pool.run(task)).toMatchObject({ result: { norms: { rows: 100_000 } } });
  });

  it('is given up where the exact solution takes too much computing, with the reason', async () => {
    const parts = Array.from({ length: 24 }, (_, part) => [`c${part}`, Array.from({ length: 90 }, (_all, term) => `erf(x*y+${part}.${term})`).join('+')] as const);
    const exact = { T: parts.map(([name]) => name).join('+') };
    const heavy = { ...reading, problem: { ...reading.problem, exact, constants: Object.fromEntries(parts) } };
    const begun = performance.now();
    await expect(pool.run({ ...task, reading: heavy }))
      .rejects.toMatchObject({ reasons: [{ code: 'too-much-computing', found: expect.stringMatching(/^after \d+ s at row \d+$/) as string }] });
    expect(performance.now() - begun).toBeLessThan(6000);
  });
});

describe('PUT /api/v1/studies/{id}/grids/{label}/data', () => {
  it('rejects a file that expands without end, with the ratio', async () => {
    const person = await signUp('Expanding');
    const work = await makeWork(person);
    const { id } = await ok(person, createStudyContract, { body: { case: work.case.slug, release: '1.0.0', grids: [{ label: 'n8', cells: 64 }] } });
    const member = gzipSync('0.5,0.5,1,1\n'.repeat(90_000));
    await putFile(person, { id, label: 'n8' }, Buffer.concat([gzipSync('x,y,w,T\n'), ...Array<Buffer>(150).fill(member)]));
    const { grids } = await awaitStudy(person, id, (study) => study.grids[0]?.state === 'rejected');
    expect(grids[0]).toMatchObject({ upload: { reasons: [{ code: 'expands-too-far', expected: 'at most 250 times as much as is stored' }] } });
  });
});
