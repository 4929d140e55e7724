import fs from 'node:fs';
import path from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { ok } from '@/tests/support/api';
import { adminDatabase } from '@/tests/support/admin-database';
import { need } from '@/tests/support/environment';
import { listen } from '@/tests/support/event-reader';
import { heatTable } from '@/tests/support/grids';
import { signUp, type Person } from '@/tests/support/people';
import { awaitOutcome, putFile } from '@/tests/support/study';
import { makeWork, type Work } from '@/tests/support/work';

let engineer: Person;
let work: Work;

beforeAll(async () => {
  engineer = await signUp('Faults');
  work = await makeWork(engineer);
});

/** The worker of this test run; whoever started it starts it again when it dies. */
function workerPid(): number {
  return Number(fs.readFileSync(path.join(need('TEST_PID_FOLDER'), 'worker.pid'), 'utf8').split(' ')[0]);
}

/** A table long enough to be still read when the worker dies: rows of n × n cells, several times over. */
function longTable(n: number, times: number): Buffer {
  const table = heatTable(n);
  const rows = table.subarray(table.indexOf('\n') + 1);
  return Buffer.concat([table, ...Array.from({ length: times - 1 }, () => rows)]);
}

describe('the worker killed by force while it reads', () => {
  it('is followed by another, and the study ends assessed exactly once', async () => {
    const sizes = [8, 16, 32];
    const study = await ok(engineer, createStudyContract, {
      body: { case: work.case.slug, release: '1.0.0', grids: [...sizes, 128].map((n) => ({ label: `n${n}`, cellsPerDirection: n })) },
    });
    for (const n of sizes) await putFile(engineer, { id: study.id, label: `n${n}` }, heatTable(n));
    const events = await listen(engineer, study.id);
    const table = longTable(128, 90);
    const sent = putFile(engineer, { id: study.id, label: 'n128' }, table);
    const heard = await events.until(({ event, data }) => event === 'progress' && data.grid === 'n128' && Number(data.rowsRead) > 0);
    const killed = workerPid();
    process.kill(killed, 'SIGKILL');
    expect(heard.some(({ data }) => data.grid === 'n128' && data.gridState === 'read')).toBe(false);
    await sent;

    const answer = await awaitOutcome(engineer, study.id);
    events.stop();
    expect(answer.outcome).toBe('pass');
    expect(answer.assessment.inputs.find(({ label }) => label === 'n128')).toMatchObject({ rows: 128 * 128 * 90, bytes: table.length });
    expect(workerPid()).not.toBe(killed);

    const database = adminDatabase();
    const { rows: assessments } = await database.query('select id from assessments where study_id = $1', [study.id]);
    expect(assessments).toHaveLength(1);
    const { rows: results } = await database.query('select 1 from grid_results r join grids g on g.id = r.grid_id where g.study_id = $1', [study.id]);
    expect(results).toHaveLength(4);
    const { rows: open } = await database.query(
      "select state from outbox where state <> 'done' and (subject_id = $1 or subject_id in (select id from grids where study_id = $1))", [study.id],
    );
    expect(open).toEqual([]);
  });
});
