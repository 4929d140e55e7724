import { Redis } from 'ioredis';
import { afterEach, beforeAll, describe, expect, it } from 'vitest';
import { createCodeContract, listCodesContract } from '@/lib/domain/codes/schema';
import { signInContract } from '@/lib/domain/people/schema';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { putDataContract, startUploadContract } from '@/lib/domain/uploads/schema';
import { adminDatabase } from '@/tests/support/admin-database';
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

describe('a call under an Idempotency-Key whose answer cannot be kept', () => {
  it('leaves nothing behind, and is carried out once when it is sent again', async () => {
    const count = async () => (await ok(engineer, listCodesContract, {})).items.length;
    const before = await count();
    const sent = { body: { name: 'Tarn' }, headers: { 'idempotency-key': 'tarn' } };
    const database = adminDatabase();
    await database.query(`create function lose_answer() returns trigger language plpgsql as $$ begin raise exception 'gone' using errcode = '57P01'; end $$;
      create trigger lose_answer before update on idempotency_keys for each row when (new.key = 'tarn') execute function lose_answer()`);
    try {
      const problem = await refused(engineer, createCodeContract, sent);
      expect([problem.status, problem.detail]).toEqual([503, expect.stringMatching(/^The database is not reachable/)]);
      expect(await count()).toBe(before);
    } finally {
      await database.query('drop trigger lose_answer on idempotency_keys; drop function lose_answer()');
    }
    const answers = await Promise.all([sent, sent, sent].map((again) => ok(engineer, createCodeContract, again)));
    expect(new Set(answers.map(({ id }) => id)).size).toBe(1);
    expect(await count()).toBe(before + 1);
  });
});
