import { Readable } from 'node:stream';
import { setTimeout as pause } from 'node:timers/promises';
import { inspect } from 'node:util';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { adminDatabase } from '../support/admin-database';
import type { Who } from '../support/api';
import { createBalanced } from '../support/balanced';
import { need } from '../support/environment';
import { startWeb, startWorker, type ExtraProcess } from '../support/extra-process';
import { heatSizes, heatTable } from '../support/grids';
import { parseMetrics, sumOf } from '../support/metrics-text';
import { makeToken, signUp, type Person } from '../support/people';
import { awaitOutcome } from '../support/study';
import { makeWork, type Work } from '../support/work';

const firstPort = Number(new URL(need('WEB_URL')).port) + 40;
const webPorts = [firstPort, firstPort + 1];
const workerPorts = [firstPort + 2, firstPort + 3];
const balanced = createBalanced(webPorts.map((port) => `http://127.0.0.1:${port}`));
const tables = heatSizes.map((n) => ({ label: `n${n}`, bytes: heatTable(n) }));

let engineer: Person;
let work: Work;
let headers: Record<string, string>;
let webs: ExtraProcess[] = [];
let workers: ExtraProcess[] = [];

// One token stands for many people here.
const webAt = (index: number) => startWeb(`web-${index + 2}`, webPorts[index] ?? 0, { TOKEN_REQUESTS_A_MINUTE: '100000' });
const workerAt = (index: number) => startWorker(`worker-${index + 2}`, workerPorts[index] ?? 0);

beforeAll(async () => {
  engineer = await signUp('Scale');
  work = await makeWork(engineer);
  const who: Who = await makeToken(engineer, { scopes: ['read', 'write'] });
  headers = { authorization: `Bearer ${who.token}` };
  [webs, workers] = await Promise.all([Promise.all([webAt(0), webAt(1)]), Promise.all([workerAt(0), workerAt(1)])]);
});

afterAll(() => Promise.all([...webs, ...workers].map((process) => process.end())));

/** A new study of the case, made through whichever web process has its turn. */
async function startStudy(): Promise<string> {
  const response = await balanced.fetch('/api/v1/studies', () => ({
    method: 'POST', headers: { ...headers, 'content-type': 'application/json' },
    body: JSON.stringify({ case: work.case.slug, release: '1.0.0', grids: heatSizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n })) }),
  }));
  if (response.status !== createStudyContract.status) throw new Error(`A study was answered ${response.status}: ${await response.text()}`);
  return ((await response.json()) as { id: string }).id;
}

/** Sends a file; with a pause it is on its way that long. */
async function sendFile(study: string, { label, bytes }: { label: string; bytes: Buffer }, milliseconds = 0): Promise<void> {
  async function* slowly() {
    yield bytes.subarray(0, 1000);
    await pause(milliseconds);
    yield bytes.subarray(1000);
  }
  const body = () => (milliseconds > 0 ? Readable.toWeb(Readable.from(slowly())) : new Uint8Array(bytes));
  const init = () => ({ method: 'PUT', headers, body: body(), ...(milliseconds > 0 ? { duplex: 'half' } : {}) }) as RequestInit;
  const response = await balanced.fetch(`/api/v1/studies/${study}/grids/${label}/data?filename=${label}.csv`, init);
  if (!response.ok) throw new Error(`${label} was answered ${response.status}: ${await response.text()}`);
  await response.arrayBuffer();
}

async function studyWithFiles(): Promise<string> {
  const study = await startStudy();
  await Promise.all(tables.map((table) => sendFile(study, table)));
  return study;
}

async function filesReadBy(port: number): Promise<number> {
  return sumOf(parseMetrics(await (await fetch(`http://127.0.0.1:${port}/metrics`)).text()), 'fourfold_files_read_total');
}

/** Every study passed, with one assessment, one result a grid, and nothing left to do. */
async function expectWhole(studies: string[]): Promise<void> {
  for (const study of studies) expect((await awaitOutcome(engineer, study)).outcome).toBe('pass');
  const count = async (query: string) => Number((await adminDatabase().query<{ count: string }>(query, [studies])).rows[0]?.count);
  expect(await count('select count(*) from assessments where study_id = any($1)')).toBe(studies.length);
  expect(await count('select count(*) from grid_results r join grids g on g.id = r.grid_id where g.study_id = any($1)')).toBe(studies.length * tables.length);
  const jobs = "from outbox where (subject_id = any($1) or subject_id in (select id from grids where study_id = any($1)))";
  await expect.poll(() => count(`select count(*) ${jobs} and state <> 'done'`)).toBe(0);
  expect(await count(`select count(*) ${jobs}`)).toBe(studies.length * (tables.length + 1));
}

describe('three workers and two web processes', () => {
  it('share the files of several studies', async () => {
    const ports = [Number(need('METRICS_PORT')), ...workerPorts];
    const before = await Promise.all(ports.map(filesReadBy));
    const studies = await Promise.all(Array.from({ length: 6 }, studyWithFiles));
    await expectWhole(studies);
    const read = (await Promise.all(ports.map(filesReadBy))).map((count, index) => count - (before[index] ?? 0));
    expect(read.reduce((sum, count) => sum + count, 0)).toBe(studies.length * tables.length);
    for (const count of read) expect(count, `${read.join(', ')}`).toBeGreaterThan(0);
  });

  it('tell a page what happens, whichever web process it asked', async () => {
    const study = await startStudy();
    const pages = webPorts.map((port) => createBalanced([`http://127.0.0.1:${port}`]).listen(`/api/v1/studies/${study}/events`, { headers }));
    await expect.poll(() => pages.every(({ events }) => events.length > 0)).toBe(true);
    for (const table of tables) await sendFile(study, table);
    for (const { events } of pages) await expect.poll(() => events.some((event) => event.includes('"state":"assessed"')), { timeout: 15_000 }).toBe(true);
    await Promise.all(pages.map(({ stop }) => stop()));
    expect(pages.map(({ endings }) => endings)).toEqual([[], []]);
  });
});

/** People and pipelines at work until told to stop: studies made, files sent, pages that listen; what failed, in words. */
function keepBusy() {
  const studies: string[] = [];
  const failures: string[] = [];
  let requests = 0;
  let isOver = false;
  const note = (error: unknown) => failures.push(inspect(error));
  const pipelines = Array.from({ length: 2 }, async () => {
    while (!isOver) {
      try {
        const study = await startStudy();
        studies.push(study);
        for (const [index, table] of tables.entries()) await sendFile(study, table, index === 0 ? 1200 : 0);
        const response = await balanced.fetch(`/api/v1/studies/${study}/outcome?wait=2`, () => ({ headers }));
        if (![200, 202].includes(response.status)) throw new Error(`The outcome was answered ${response.status}.`);
        await response.arrayBuffer();
      } catch (error) {
        note(error);
      }
    }
  });
  const readers = Array.from({ length: 2 }, async () => {
    while (!isOver) {
      try {
        const response = await balanced.fetch('/api/v1/studies', () => ({ headers }));
        if (!response.ok) throw new Error(`Studies were answered ${response.status}.`);
        await response.arrayBuffer();
        requests += 1;
      } catch (error) {
        note(error);
      }
      await pause(20);
    }
  });
  return {
    studies, failures, requests: () => requests,
    async stop() {
      isOver = true;
      await Promise.all([...pipelines, ...readers]);
    },
  };
}

describe('a rolling restart', () => {
  it('fails no request, loses and doubles no job, and brings every page back', async () => {
    const watched = await startStudy();
    const pages = [0, 1].map(() => balanced.listen(`/api/v1/studies/${watched}/events`, { headers }));
    const busy = keepBusy();
    await pause(500);
    for (const index of [0, 1]) {
      expect(await webs[index]?.end()).toBe(0);
      webs[index] = await webAt(index);
      expect(await workers[index]?.end()).toBe(0);
      workers[index] = await workerAt(index);
    }
    await busy.stop();
    await Promise.all(tables.map((table) => sendFile(watched, table)));
    expect(busy.failures).toEqual([]);
    expect(busy.requests()).toBeGreaterThan(50);
    expect(busy.studies.length).toBeGreaterThan(2);
    await expectWhole([...busy.studies, watched]);
    for (const { events, endings, stop } of pages) {
      await expect.poll(() => events.some((event) => event.includes('"state":"assessed"'))).toBe(true);
      expect(endings.length).toBeGreaterThan(0);
      expect([...new Set(endings)]).toEqual(['retry: 500']);
      await stop();
    }
  });
});
