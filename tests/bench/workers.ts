// How many files and bytes a second 1, 2 and 3 worker processes of one thread each read, over equal files.
import os from 'node:os';
import { setTimeout as pause } from 'node:timers/promises';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { adminDatabase } from '../support/admin-database';
import { ok } from '../support/api';
import { need } from '../support/environment';
import { startWorker } from '../support/extra-process';
import { heatTable } from '../support/grids';
import { signUp, type Person } from '../support/people';
import { putFile } from '../support/study';
import { makeWork, type Work } from '../support/work';

const [files = 24, cells = 400] = process.argv.slice(2).map(Number);
const filesAStudy = 8;
const firstPort = Number(new URL(need('WEB_URL')).port) + 20;
const table = heatTable(cells);

/** Sends the files while no worker runs, so that all wait when the first one starts. */
async function sendFiles(person: Person, work: Work): Promise<string[]> {
  const studies: string[] = [];
  for (let sent = 0; sent < files; sent += filesAStudy) {
    const grids = Array.from({ length: Math.min(filesAStudy, files - sent) }, (_, index) => ({ label: `g${index}`, h: 1 / (index + 1) }));
    const study = await ok(person, createStudyContract, { body: { case: work.case.slug, release: '1.0.0', grids } });
    for (const { label } of grids) await putFile(person, { id: study.id, label }, table);
    studies.push(study.id);
  }
  return studies;
}

async function untilRead(studies: string[]): Promise<void> {
  for (;;) {
    const { rows: [row] } = await adminDatabase().query<{ open: string; rejected: string }>(
      "select count(*) filter (where state <> 'read') as open, count(*) filter (where state = 'rejected') as rejected from grids where study_id = any($1)", [studies],
    );
    if (row?.rejected !== '0') throw new Error('A file was rejected.');
    if (row.open === '0') return;
    await pause(50);
  }
}

async function measure({ count, threads }: { count: number; threads: number }, person: Person, work: Work): Promise<number> {
  const studies = await sendFiles(person, work);
  const begun = performance.now();
  const workers = await Promise.all(Array.from({ length: count }, (_, index) => startWorker(`bench-worker-${index + 1}`, firstPort + index, { WORKER_THREADS: String(threads) })));
  const ready = performance.now();
  await untilRead(studies);
  const seconds = (performance.now() - begun) / 1000;
  console.log(`${count} of ${threads}  ${seconds.toFixed(2).padStart(7)} s (${((ready - begun) / 1000).toFixed(2)} s of them starting)  ${(files / seconds).toFixed(2).padStart(6)} files/s  ` +
    `${((files * table.length) / 1e6 / seconds).toFixed(1).padStart(6)} MB/s`);
  await Promise.all(workers.map((worker) => worker.end()));
  return seconds;
}

const person = await signUp('Bench');
const work = await makeWork(person);
console.log(`${files} files of ${cells * cells} rows and ${(table.length / 1e6).toFixed(1)} MB; ${os.availableParallelism()} processors.\nworkers of so many threads:`);
const seconds: number[] = [];
// The files of a study are read by both threads of one worker, too.
for (const workers of [{ count: 1, threads: 1 }, { count: 2, threads: 1 }, { count: 3, threads: 1 }, { count: 1, threads: 2 }]) seconds.push(await measure(workers, person, work));
console.log(`speed-up over one worker of one thread: ${seconds.map((each) => ((seconds[0] ?? 0) / each).toFixed(2)).join(', ')}`);
await adminDatabase().end();
