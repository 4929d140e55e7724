import { Redis } from 'ioredis';
import { afterEach, beforeAll, describe, expect, it } from 'vitest';
import { createCodeContract, listCodesContract } from '@/lib/domain/codes/schema';
import { signInContract } from '@/lib/domain/people/schema';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { putDataContract, startUploadContract } from '@/lib/domain/uploads/schema';
import { ok, refused } from '@/tests/support/api';
import { need } from '@/tests/support/environment';
import { recordFaults } from '@/tests/support/faults/run-schedule';
import { heatSizes, heatTable } from '@/tests/support/grids';
import { breakNetwork, mendNetwork } from '@/tests/support/network/break-network';
import { signUp, type Person } from '@/tests/support/people';
import { awaitOutcome, putFile } from '@/tests/support/study';
import { makeWork, type Work } from '@/tests/support/work';

let engineer: Person;
let work: Work;

beforeAll(async () => {
  engineer = await signUp('No room');
  work = await makeWork(engineer);
});
afterEach(mendNetwork);

const makeStudy = () => ok(engineer, createStudyContract, {
  body: { case: work.case.slug, release: '1.0.0', grids: heatSizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n })) },
});

describe('storage without space', () => {
  it('is named in the answer, keeps what was confirmed, and takes the rest once there is room', async () => {
    const study = await makeStudy();
    const params = { id: study.id, label: 'n8' };
    await putFile(engineer, params, heatTable(8));
    await breakNetwork({ client: 'web', service: 'storage', kind: 'error', status: 507, milliseconds: 20_000 });
    const put = await refused(engineer, putDataContract, { params: { id: study.id, label: 'n16' }, body: heatTable(16), headers: { 'content-type': 'application/octet-stream' } });
    expect([put.status, put.detail]).toEqual([503, expect.stringMatching(/^Storage for files has no space left/)]);
    const parts = await refused(engineer, startUploadContract, { params: { id: study.id, label: 'n16' }, body: { filename: 'n16.csv', bytes: 100 } });
    expect([parts.status, parts.detail]).toEqual([503, expect.stringMatching(/^Storage for files has no space left/)]);
    await mendNetwork();
    for (const n of heatSizes.slice(1)) await putFile(engineer, { id: study.id, label: `n${n}` }, heatTable(n));
    expect((await awaitOutcome(engineer, study.id)).outcome).toBe('pass');
    expect(await recordFaults(engineer.at.id)).toEqual([]);
  });
});

describe('Redis without memory', () => {
  it('is named where it is needed, refuses nothing else, and jobs go on once there is room', async () => {
    const redis = new Redis(need('REDIS_URL'));
    const study = await makeStudy();
    try {
      await redis.config('SET', 'maxmemory', '1');
      const refusal = await refused(null, signInContract, { body: { email: engineer.email, password: 'wrong' } });
      expect([refusal.status, refusal.detail]).toEqual([503, expect.stringMatching(/^Redis has no space left/)]);
      for (const n of heatSizes) await putFile(engineer, { id: study.id, label: `n${n}` }, heatTable(n));
    } finally {
      await redis.config('SET', 'maxmemory', '0');
      redis.disconnect();
    }
    expect((await awaitOutcome(engineer, study.id)).outcome).toBe('pass');
    expect(await recordFaults(engineer.at.id)).toEqual([]);
  });
});

describe('services that are out of reach', () => {
  it.each([['postgres', 'The database'], ['storage', 'Storage for files']] as const)('%s is named in the answer', async (service, name) => {
    const study = await makeStudy();
    await breakNetwork({ client: 'web', service, kind: 'cut', milliseconds: 20_000 });
    const problem = await refused(engineer, putDataContract, { params: { id: study.id, label: 'n8' }, body: heatTable(8), headers: { 'content-type': 'application/octet-stream' } });
    expect(problem.status).toBe(503);
    expect(problem.detail).toMatch(new RegExp(`^(${name}|A service behind Fourfold) is not reachable`));
  });

  it('storage that says nothing is given up, and the file is taken by the next call', async () => {
    const study = await makeStudy();
    await breakNetwork({ client: 'web', service: 'storage', kind: 'stall', milliseconds: 500 });
    await putFile(engineer, { id: study.id, label: 'n8' }, heatTable(8));
  });
});

describe('a call under an Idempotency-Key whose answer was lost', () => {
  it('is carried out once, however often it is sent and whatever breaks meanwhile', async () => {
    const before = (await ok(engineer, listCodesContract, {})).items.length;
    const call = () => ok(engineer, createCodeContract, { body: { name: 'Tarn' }, headers: { 'idempotency-key': 'tarn' } });
    const slow = breakNetwork({ client: 'web', service: 'postgres', kind: 'latency', delay: 40, milliseconds: 3000 });
    await slow;
    const first = call().catch(() => null);
    await new Promise((resolve) => setTimeout(resolve, 350));
    await breakNetwork({ client: 'web', service: 'postgres', kind: 'cut', milliseconds: 50 });
    await first;
    await mendNetwork();
    const answers = await Promise.all([call(), call(), call()]);
    expect(new Set(answers.map(({ id }) => id)).size).toBe(1);
    expect((await ok(engineer, listCodesContract, {})).items.length).toBe(before + 1);
  });
});
