import { randomUUID } from 'node:crypto';
import { Readable } from 'node:stream';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createStudyContract, getStudyContract, type Study } from '@/lib/domain/studies/schema';
import { getStorageContract } from '@/lib/domain/storage/schema';
import { getUploadContract, signPartsContract, startUploadContract } from '@/lib/domain/uploads/schema';
import { sweepOrganisation, sweepOutbox } from '@/lib/services/sweeps/sweep';
import { adminDatabase } from '@/tests/support/admin-database';
import { ok, refused, send } from '@/tests/support/api';
import { listen } from '@/tests/support/event-reader';
import { heatTable } from '@/tests/support/grids';
import { signUp, type Person } from '@/tests/support/people';
import { awaitStudy, putFile } from '@/tests/support/study';
import { openSweeping } from '@/tests/support/sweeping';
import { makeWork, type Work } from '@/tests/support/work';

const hour = 3600 * 1000;
let engineer: Person;
let work: Work;
let hoursLater = 0;
const { ctx, close } = openSweeping(() => new Date(Date.now() + hoursLater * hour));
const sweepAfter = (hours: number) => {
  hoursLater = hours;
  return sweepOrganisation({ ...ctx, organisation: { id: engineer.at.id } });
};

beforeAll(async () => {
  engineer = await signUp('Sweeping');
  work = await makeWork(engineer);
});
afterAll(close);

const make = (): Promise<Study> => ok(engineer, createStudyContract, {
  body: { case: work.case.slug, release: '1.0.0', grids: [8, 16].map((n) => ({ label: `n${n}`, cellsPerDirection: n })) },
});
const gridOf = (study: Study, label: string) => study.grids.find((grid) => grid.label === label);
const keysOf = async () => {
  const keys: string[] = [];
  for await (const { key } of ctx.storage.listObjects(`${engineer.at.id}/`)) keys.push(key);
  return keys;
};
const multipartsOf = async () => {
  const ids: string[] = [];
  for await (const { multipartId } of ctx.storage.listMultiparts(`${engineer.at.id}/`)) ids.push(multipartId);
  return ids;
};

describe('an upload of which nothing is heard', () => {
  it('is given up after a day, its parts freed, its grid as before, and pages are told', async () => {
    const study = await make();
    const first = await putFile(engineer, { id: study.id, label: 'n8' }, heatTable(8));
    await awaitStudy(engineer, study.id, (now) => gridOf(now, 'n8')?.state === 'read');
    const again = await ok(engineer, startUploadContract, { params: { id: study.id, label: 'n8' }, body: { filename: 'again.csv', bytes: 100 } });
    const other = await ok(engineer, startUploadContract, { params: { id: study.id, label: 'n16' }, body: { filename: 'n16.csv', bytes: 100 } });
    const { parts: [part] } = await ok(engineer, signPartsContract, { params: { id: other.upload }, body: { numbers: [1] } });
    expect((await fetch(part?.url ?? '', { method: 'PUT', body: 'x'.repeat(100) })).status).toBe(200);

    expect(await sweepAfter(23)).toMatchObject({ idleUploads: 0, strayMultiparts: 0 });
    expect(await ok(engineer, getUploadContract, { params: { id: other.upload } })).toMatchObject({ state: 'receiving', parts: [{ bytes: 100 }] });

    const events = await listen(engineer, study.id);
    await events.until(({ event }) => event === 'snapshot');
    // Two workers at once do what one does.
    const swept = await Promise.all([sweepAfter(25), sweepAfter(25)]);
    expect(swept.reduce((sum, { idleUploads }) => sum + idleUploads, 0)).toBe(2);
    await events.until(({ event, data }) => event === 'state' && data.grid === 'n16');
    events.stop();
    for (const { upload } of [again, other]) expect((await refused(engineer, getUploadContract, { params: { id: upload } })).status).toBe(404);
    expect(await multipartsOf()).toEqual([]);
    const after = await awaitStudy(engineer, study.id, (now) => gridOf(now, 'n8')?.state === 'read');
    expect([gridOf(after, 'n8')?.upload?.id, gridOf(after, 'n16')?.state, gridOf(after, 'n16')?.upload]).toEqual([first.id, 'expected', null]);
  });
});

describe('what no row names', () => {
  it('is removed from storage after a day, and nothing else', async () => {
    const study = await make();
    const kept = await putFile(engineer, { id: study.id, label: 'n8' }, heatTable(8));
    const open = await ok(engineer, startUploadContract, { params: { id: study.id, label: 'n16' }, body: { filename: 'n16.csv', bytes: 100 } });
    await ctx.storage.put(`${engineer.at.id}/reports/1.pdf`, Readable.from([Buffer.from('of another kind')]));
    const before = await keysOf();
    const stray = `${engineer.at.id}/${study.id}/${randomUUID()}`;
    await ctx.storage.put(stray, Readable.from([Buffer.from('left behind')]));
    await ctx.storage.startMultipart(`${engineer.at.id}/${study.id}/${randomUUID()}`);
    expect(await sweepAfter(1)).toMatchObject({ strayObjects: 0, strayMultiparts: 0 });

    // The open upload was asked for meanwhile, so only what nobody names goes.
    await adminDatabase().query('update uploads set last_activity_at = $2 where id = $1', [open.upload, new Date(Date.now() + 24 * hour)]);
    expect(await sweepAfter(25)).toMatchObject({ idleUploads: 0, strayObjects: 1, strayMultiparts: 1 });
    expect(await keysOf()).toEqual(before);
    expect(await multipartsOf()).toHaveLength(1);
    expect(await ok(engineer, getUploadContract, { params: { id: kept.id } })).toMatchObject({ id: kept.id });
  });
});

describe('a file that another took the place of', () => {
  it('counts until it is removed, a day after; the file of the grid stays', async () => {
    await sweepAfter(49);
    const study = await make();
    const old = await putFile(engineer, { id: study.id, label: 'n8' }, heatTable(8));
    await awaitStudy(engineer, study.id, (now) => gridOf(now, 'n8')?.state === 'read');
    const { used } = await ok(engineer, getStorageContract, {});
    const later = await putFile(engineer, { id: study.id, label: 'n8' }, heatTable(16));
    await awaitStudy(engineer, study.id, (now) => gridOf(now, 'n8')?.state === 'read');
    expect((await ok(engineer, getStorageContract, {})).used).toBe(used + heatTable(16).length);
    expect(await sweepAfter(23)).toMatchObject({ replacedFiles: 0 });
    expect(await sweepAfter(25)).toMatchObject({ replacedFiles: 1, strayObjects: 0 });
    expect((await refused(engineer, getUploadContract, { params: { id: old.id } })).status).toBe(404);
    expect((await ok(engineer, getStorageContract, {})).used).toBe(used + heatTable(16).length - heatTable(8).length);
    expect(gridOf(await ok(engineer, getStudyContract, { params: { id: study.id } }), 'n8')).toMatchObject({ state: 'read', upload: { id: later.id } });
  });
});

describe('rows that are done with', () => {
  it('go: outbox rows after a week, idempotency keys after a day', async () => {
    const key = randomUUID();
    const made = await send(engineer, createStudyContract, {
      body: { case: work.case.slug, release: '1.0.0', grids: [{ label: 'n8', cellsPerDirection: 8 }] }, headers: { 'idempotency-key': key },
    });
    expect(made.status).toBe(201);
    await putFile(engineer, { id: (made.body as Study).id, label: 'n8' }, heatTable(8));
    await awaitStudy(engineer, (made.body as Study).id, ({ state }) => state !== 'collecting');
    const outbox = async () => (await adminDatabase().query("select count(*)::int as n from outbox where organisation_id = $1 and state = 'done'", [engineer.at.id])).rows[0] as { n: number };
    expect((await outbox()).n).toBeGreaterThan(0);
    const keys = async () => (await adminDatabase().query('select count(*)::int as n from idempotency_keys where key = $1', [key])).rows[0] as { n: number };

    expect(await sweepAfter(23)).toMatchObject({ idempotencyKeys: 0 });
    hoursLater = 6 * 24;
    await sweepOutbox(ctx);
    expect((await outbox()).n).toBeGreaterThan(0);
    expect(await sweepAfter(25)).toMatchObject({ idempotencyKeys: 1 });
    expect((await keys()).n).toBe(0);
    hoursLater = 8 * 24;
    expect(await sweepOutbox(ctx)).toBeGreaterThan(0);
    expect((await outbox()).n).toBe(0);
  });
});
