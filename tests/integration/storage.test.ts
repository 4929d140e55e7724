import { beforeAll, describe, expect, it } from 'vitest';
import { createStudyContract, getStudyContract, type Study } from '@/lib/domain/studies/schema';
import { getStorageContract } from '@/lib/domain/storage/schema';
import { deleteUploadContract, putDataContract, startUploadContract } from '@/lib/domain/uploads/schema';
import { adminDatabase } from '@/tests/support/admin-database';
import { ok, refused, send } from '@/tests/support/api';
import { heatTable } from '@/tests/support/grids';
import { addMember, signUp, type Person } from '@/tests/support/people';
import { putFile } from '@/tests/support/study';
import { makeWork, type Work } from '@/tests/support/work';

let engineer: Person;
let work: Work;
const table = heatTable(8);
const labels = ['n8', 'n16', 'n32', 'n64'];

beforeAll(async () => {
  engineer = await signUp('Stores');
  work = await makeWork(engineer);
});

const make = (): Promise<Study> => ok(engineer, createStudyContract, {
  body: { case: work.case.slug, release: '1.0.0', grids: labels.map((label) => ({ label, cellsPerDirection: Number(label.slice(1)) })) },
});
const setQuota = (bytes: number | null) => adminDatabase().query('update organisations set storage_quota_bytes = $2 where id = $1', [engineer.at.id, bytes]);
const start = (study: Study, label: string, bytes: number) => send(engineer, startUploadContract, { params: { id: study.id, label }, body: { filename: `${label}.csv`, bytes } });
const use = () => ok(engineer, getStorageContract, {});

describe('GET /api/v1/storage', () => {
  it('counts whole files and what open uploads announced, by study', async () => {
    const study = await make();
    const before = await use();
    await putFile(engineer, { id: study.id, label: 'n8' }, table);
    const { upload } = await ok(engineer, startUploadContract, { params: { id: study.id, label: 'n16' }, body: { filename: 'n16.csv', bytes: 5000 } });
    const now = await use();
    expect(now).toMatchObject({ quota: 100e9, used: before.used + table.length + 5000, announced: before.announced + 5000 });
    expect(now.studies).toContainEqual({ id: study.id, code: 'Brack', release: '1.0.0', case: 'Heat, second order', bytes: table.length, files: 1 });
    expect(now.uploads).toContainEqual(expect.objectContaining({ id: upload, study: study.id, grid: 'n16', filename: 'n16.csv', bytes: 5000, createdBy: engineer.email }));
    await ok(engineer, deleteUploadContract, { params: { id: upload } });
    expect(await use()).toMatchObject({ used: before.used + table.length, announced: before.announced });
  });

  it('shows a reviewer the same, and another organisation nothing of it', async () => {
    const reviewer = await addMember(engineer.at, ['reviewer']);
    expect(await ok(reviewer, getStorageContract, {})).toEqual(await use());
    const stranger = await signUp('Strangers');
    expect(await ok(stranger, getStorageContract, {})).toEqual({ quota: 100e9, used: 0, announced: 0, studies: [], uploads: [] });
    expect((await refused({ ...stranger, organisation: engineer.at.slug }, getStorageContract, {})).status).toBe(404);
  });
});

describe('the quota of an organisation', () => {
  it('refuses what does not fit, in one call and in parts, naming use, quota and the mend; nothing is kept', async () => {
    const study = await make();
    const { used } = await use();
    await setQuota(used + table.length - 1);
    const binary = { 'content-type': 'application/octet-stream' };
    const refusals = [
      await refused(engineer, startUploadContract, { params: { id: study.id, label: 'n8' }, body: { filename: 'n8.csv', bytes: table.length } }),
      await refused(engineer, putDataContract, { params: { id: study.id, label: 'n8' }, body: table, headers: binary }),
    ];
    for (const problem of refusals) {
      expect(problem).toMatchObject({ status: 413, title: 'No room left' });
      expect(problem.detail).toMatch(/^The file has [\d.]+\skB and does not fit: Stores uses [\d.]+\skB of [\d.]+\skB\. Give up uploads in progress/);
    }
    expect(await ok(engineer, getStudyContract, { params: { id: study.id } })).toMatchObject({ planFrozenAt: null });
    expect((await use()).used).toBe(used);
    await setQuota(used + table.length);
    await putFile(engineer, { id: study.id, label: 'n8' }, table);
    await setQuota(null);
  });

  it('stops a body of unknown length where the room ends', async () => {
    const study = await make();
    const { used } = await use();
    await setQuota(used + 1000);
    const stream = new ReadableStream({ pull(controller) { controller.enqueue(new Uint8Array(64 * 1024).fill(120)); } });
    const address = `${process.env.WEB_URL}/api/v1/studies/${study.id}/grids/n8/data`;
    const answer = await fetch(address, {
      method: 'PUT', body: stream, duplex: 'half', headers: { cookie: engineer.cookie, origin: process.env.WEB_URL ?? '', 'content-type': 'application/octet-stream' },
    } as RequestInit);
    expect(answer.status).toBe(413);
    expect((await use()).used).toBe(used);
    await setQuota(null);
  });

  it('lets only one of several that start at the same moment have the last room', async () => {
    const study = await make();
    const { used } = await use();
    await setQuota(used + 1500);
    const answers = await Promise.all(labels.map((label) => start(study, label, 1000)));
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 413, 413, 413]);
    await setQuota(used + 2500);
    // A file that takes the place of an open one needs only what that did not announce.
    const [open] = (await use()).uploads.filter((upload) => upload.study === study.id);
    expect((await start(study, open?.grid ?? '', 2500)).status).toBe(201);
    await setQuota(null);
  });
});

it('at most 200 uploads of an organisation are open', async () => {
  const study = await make();
  const { upload } = await ok(engineer, startUploadContract, { params: { id: study.id, label: 'n8' }, body: { filename: 'n8.csv', bytes: 100 } });
  await adminDatabase().query(`insert into uploads (organisation_id, id, grid_id, filename, bytes, storage_key, multipart_id, part_size, created_by)
    select organisation_id, gen_random_uuid(), grid_id, filename, bytes, storage_key || n, 'none', part_size, created_by from uploads, generate_series(1, 200) n where id = $1`, [upload]);
  const answer = await start(study, 'n16', 100);
  expect([answer.status, (answer.body as { detail: string }).detail]).toEqual([409, expect.stringContaining('at most 200 may be')]);
  await adminDatabase().query("update uploads set state = 'given-up' where organisation_id = $1 and multipart_id = 'none'", [engineer.at.id]);
  expect((await start(study, 'n16', 100)).status).toBe(201);
});
