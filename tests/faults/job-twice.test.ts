import { setTimeout as pause } from 'node:timers/promises';
import { Redis } from 'ioredis';
import { beforeAll, describe, expect, it } from 'vitest';
import { createStudyContract, type Study } from '@/lib/domain/studies/schema';
import { adminDatabase } from '@/tests/support/admin-database';
import { ok } from '@/tests/support/api';
import { need } from '@/tests/support/environment';
import { listen } from '@/tests/support/event-reader';
import { startWorker } from '@/tests/support/extra-process';
import { signal } from '@/tests/support/faults/processes';
import { recordFaults } from '@/tests/support/faults/run-schedule';
import { heatTable } from '@/tests/support/grids';
import { signUp, type Person } from '@/tests/support/people';
import { awaitOutcome, awaitStudy, putFile } from '@/tests/support/study';
import { makeWork, type Work } from '@/tests/support/work';

let engineer: Person;
let work: Work;
const sizes = [8, 16, 32, 128];

beforeAll(async () => {
  engineer = await signUp('Twice');
  work = await makeWork(engineer);
});

const makeStudy = (): Promise<Study> => ok(engineer, createStudyContract, {
  body: { case: work.case.slug, release: '1.0.0', grids: sizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n })) },
});

/** Read long enough to be stopped in the middle: the rows of 128 × 128 cells, many times over. */
function longTable(): Buffer {
  const table = heatTable(128);
  const rows = table.subarray(table.indexOf('\n') + 1);
  return Buffer.concat([table, ...Array.from({ length: 60 }, () => rows)]);
}

async function expectOnce(study: Study): Promise<void> {
  const answer = await awaitOutcome(engineer, study.id);
  expect(answer.outcome).toBe('pass');
  const { rows } = await adminDatabase().query('select id from assessments where study_id = $1', [study.id]);
  expect(rows).toHaveLength(1);
  expect((await awaitStudy(engineer, study.id, () => true)).failure).toBeNull();
  expect(await recordFaults(engineer.at.id)).toEqual([]);
}

describe('a worker that stands still until another has taken its job', () => {
  it('goes on to the end of it, and the result is there once', async () => {
    const study = await makeStudy();
    for (const n of sizes.slice(0, 3)) await putFile(engineer, { id: study.id, label: `n${n}` }, heatTable(n));
    const events = await listen(engineer, study.id);
    const sent = putFile(engineer, { id: study.id, label: 'n128' }, longTable());
    await events.until(({ event, data }) => event === 'progress' && data.grid === 'n128' && Number(data.rowsRead) > 0);
    events.stop();
    signal('worker', 'SIGSTOP');
    const other = await startWorker('worker-3', Number(new URL(need('WEB_URL')).port) + 16);
    try {
      await sent;
      await awaitStudy(engineer, study.id, ({ state }) => state === 'assessed');
      signal('worker', 'SIGCONT');
      // Long enough for what was under way to come to its end as well.
      await pause(3000);
      await expectOnce(study);
    } finally {
      signal('worker', 'SIGCONT');
      await other.end();
    }
  });
});

describe('Redis emptied while jobs wait in it', () => {
  it('is noticed within seconds, and every job is queued again', async () => {
    const study = await makeStudy();
    const redis = new Redis(need('REDIS_URL'));
    const tables = sizes.map((n) => ({ n, table: n === 128 ? longTable() : heatTable(n) }));
    const sent = Promise.all(tables.map(({ n, table }) => putFile(engineer, { id: study.id, label: `n${n}` }, table)));
    await sent;
    await redis.flushall();
    redis.disconnect();
    const begun = Date.now();
    await expectOnce(study);
    expect(Date.now() - begun).toBeLessThan(30_000);
  });
});
