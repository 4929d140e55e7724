import { setTimeout as pause } from 'node:timers/promises';
import { beforeAll, describe, expect, it } from 'vitest';
import { listRechecksContract, requestRecheckContract, type Recheck } from '@/lib/domain/studies/recheck-schema';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { adminDatabase } from '../support/admin-database';
import { ok, refused } from '../support/api';
import { heatSizes, heatTable } from '../support/grids';
import { signUp, type Person } from '../support/people';
import { awaitOutcome, putFile } from '../support/study';
import { makeWork, type Work } from '../support/work';

let engineer: Person;
let work: Work;
let study: string;
beforeAll(async () => {
  engineer = await signUp('Recheck Works');
  work = await makeWork(engineer);
  const made = await ok(engineer, createStudyContract, { body: { case: work.case.slug, release: '1.0.0', grids: work.case.gridPlan } });
  for (const n of heatSizes) await putFile(engineer, { id: made.id, label: `n${n}` }, heatTable(n));
  await awaitOutcome(engineer, made.id);
  study = made.id;
});

async function recheck(): Promise<Recheck> {
  const { id } = await ok(engineer, requestRecheckContract, { params: { id: study } });
  for (let waited = 0; waited < 300; waited += 1) {
    const { items } = await ok(engineer, listRechecksContract, { params: { id: study } });
    const found = items.find((item) => item.id === id);
    if (found?.state === 'done') return found;
    await pause(100);
  }
  throw new Error('The re-check is not done after 30 seconds.');
}

describe('POST /api/v1/studies/{id}/rechecks', () => {
  it('reads the files again and finds the result identical, then tells what differs', async () => {
    expect(await recheck()).toMatchObject({ study, revision: 1, result: 'identical', largestDifference: 0, differences: [], requestedBy: engineer.email });
    const change = (factor: number) => adminDatabase().query(`
      update grid_results set norms = jsonb_set(norms, '{fields,0,L2}', to_jsonb((norms #>> '{fields,0,L2}')::double precision * $2::double precision))
      where grid_id in (select id from grids where study_id = $1 and label = 'n64')
    `, [study, factor]);
    await change(1 + 1e-12);
    const near = await recheck();
    expect(near.result).toBe('within-1e-10');
    expect(near.largestDifference).toBeLessThan(2e-12);
    await change(1.001);
    expect(await recheck()).toMatchObject({ result: 'not-reproduced', differences: [expect.objectContaining({ path: 'grids.n64.fields.0.L2' })] });
    expect((await ok(engineer, listRechecksContract, { params: { id: study } })).items.map(({ result }) => result)).toEqual(['not-reproduced', 'within-1e-10', 'identical']);
  });

  it('answers 409 while there is no result, and 404 for another organisation', async () => {
    const open = await ok(engineer, createStudyContract, { body: { case: work.case.slug, release: '1.0.0', grids: work.case.gridPlan } });
    expect((await refused(engineer, requestRecheckContract, { params: { id: open.id } })).status).toBe(409);
    const stranger = await signUp('Stranger Works');
    expect((await refused(stranger, requestRecheckContract, { params: { id: study } })).status).toBe(404);
    expect((await refused(stranger, listRechecksContract, { params: { id: study } })).status).toBe(404);
  });
});
