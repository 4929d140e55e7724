import fs from 'node:fs';
import type { Route } from 'playwright-core';
import { describe, expect } from 'vitest';
import { getStudyContract } from '@/lib/domain/studies/schema';
import { createStorage } from '@/lib/platform/storage';
import { storageOptionsOf } from '@/lib/platform/storage-options';
import { readEnv } from '@/lib/env';
import { adminDatabase } from '@/tests/support/admin-database';
import { ok } from '@/tests/support/api';
import { browserTest } from '@/tests/support/browser';
import { signUp } from '@/tests/support/people';
import { bigTable, fileInput, fileOf, makeUploadStudy, rowOf, throttle } from '@/tests/support/uploading';

/** The address of a part in storage, which these tests make fail. */
const failing = /partNumber=\d+&/;
const partsCall = /\/uploads\/[^/]+\/parts/;

/** Answers a call for addresses with some that hold for one second, two seconds later. */
async function answerTooLate(route: Route): Promise<void> {
  const upload = /uploads\/([^/]+)\//.exec(route.request().url())?.[1] ?? '';
  const { numbers } = route.request().postDataJSON() as { numbers: number[] };
  const { rows: [row] } = await adminDatabase().query<{ storage_key: string; multipart_id: string }>('select storage_key, multipart_id from uploads where id = $1', [upload]);
  const storage = createStorage({ ...storageOptionsOf(readEnv(process.env)), partLifetimeSeconds: 1 });
  const parts = await Promise.all(numbers.map(async (number) => ({ number, url: await storage.signPart(row?.storage_key ?? '', row?.multipart_id ?? '', number), expiresAt: new Date(Date.now() + 1000).toISOString() })));
  await new Promise((resolve) => setTimeout(resolve, 2500));
  // The page is to find out by the answer of storage: by its own clock they hold.
  await route.fulfill({ json: { parts: parts.map((part) => ({ ...part, expiresAt: new Date(Date.now() + 3_600_000).toISOString() })) } });
}

describe('a file on a bad line', () => {
  browserTest('gets through cut connections, 5xx and addresses past their time, and is stored as it was', async ({ open }) => {
    const person = await signUp();
    const study = await makeUploadStudy(person);
    const page = await open(`/${person.at.slug}/studies/${study.id}`, { person, failing });
    await page.route(partsCall, answerTooLate, { times: 1 });
    let cut = 0;
    const sent: string[] = [];
    page.on('request', (request) => { if (request.method() === 'PUT') sent.push(request.url()); });
    await page.route(/partNumber=1&/, async (route) => {
      if (route.request().method() !== 'PUT' || cut >= 2) { await route.continue(); return; }
      cut += 1;
      if (cut === 1) await route.abort('connectionfailed');
      else await route.fulfill({ status: 503, headers: { 'access-control-allow-origin': '*' } });
    });
    await fileInput(page).setInputFiles(fileOf('n16.csv', bigTable(20)));
    await rowOf(page, 'n16').getByText('256 rows').waitFor({ timeout: 60_000 });
    expect(cut).toBe(2);
    expect(sent.filter((url) => url.includes('X-Amz-Expires=1&')).length).toBeGreaterThanOrEqual(3);
    const { grids } = await ok(person, getStudyContract, { params: { id: study.id } });
    const { rows: [row] } = await adminDatabase().query<{ stated_sha256: string; sha256: string }>('select stated_sha256, sha256 from uploads where id = $1', [grids.find(({ label }) => label === 'n16')?.upload?.id]);
    expect(row?.stated_sha256).toMatch(/^[0-9a-f]{64}$/);
    expect(row?.stated_sha256).toBe(row?.sha256);
  });

  browserTest('waits without a network and goes on by itself; what is refused says why and is retried; leaving asks', async ({ open }) => {
    const person = await signUp();
    const study = await makeUploadStudy(person);
    const page = await open(`/${person.at.slug}/studies/${study.id}`, { person, failing });
    await page.route(partsCall, (route) => route.fulfill({ status: 409, contentType: 'application/problem+json', json: { type: 'x', title: 'x', status: 409, detail: 'Not for now.', errors: [] } }), { times: 1 });
    await fileInput(page).setInputFiles(fileOf('n16.csv', bigTable(60)));
    await page.getByText('Not for now.').waitFor();
    const line = await throttle(page, 10e6);
    await page.getByRole('button', { name: 'Retry, grid n16' }).click();
    await rowOf(page, 'n16').getByText(/^(8\.4|17|25)\sMB of/).waitFor();
    await line.set('offline');
    await rowOf(page, 'n16').getByText('waiting', { exact: true }).waitFor();
    const asked = page.waitForEvent('dialog');
    void page.close({ runBeforeUnload: true });
    const dialog = await asked;
    expect(dialog.type()).toBe('beforeunload');
    await dialog.dismiss();
    await line.set(-1);
    await rowOf(page, 'n16').getByText('256 rows').waitFor({ timeout: 30_000 });
  });

  browserTest('that changes on disk meanwhile is not sent, and says so; what is empty is not either', async ({ open }) => {
    const person = await signUp();
    const study = await makeUploadStudy(person);
    const page = await open(`/${person.at.slug}/studies/${study.id}`, { person, failing });
    await throttle(page, 5e6);
    const file = fileOf('n16.csv', bigTable(40));
    await fileInput(page).setInputFiles(file);
    await rowOf(page, 'n16').getByText('receiving').waitFor();
    fs.appendFileSync(file, '# more\n');
    await page.getByText('n16.csv changed on disk while it was being sent. Choose it again once it is written.').waitFor({ timeout: 30_000 });
    await page.getByRole('button', { name: 'Choose a file, grid n16' }).waitFor();
    await expect.poll(async () => (await ok(person, getStudyContract, { params: { id: study.id } })).grids.find(({ label }) => label === 'n16')?.state).toBe('expected');
    await fileInput(page).setInputFiles(fileOf('n8.csv', ''));
    await page.getByText('n8.csv is empty. Check that the solver had finished writing.').waitFor();
  });

  browserTest('of any size and name arrives: one byte, one part to the byte, odd characters', async ({ open }) => {
    const person = await signUp();
    const study = await makeUploadStudy(person);
    const page = await open(`/${person.at.slug}/studies/${study.id}`, { person, failing });
    const part = 8 * 1024 * 1024;
    const table = bigTable(9).subarray(0, part - 1);
    await fileInput(page).setInputFiles([fileOf('n8.csv', 'x'), fileOf("n16 – Größe 100% #1 & 'b'.csv", Buffer.concat([table, Buffer.from('\n')]))]);
    await rowOf(page, 'n8').getByText(/^(needs columns|rejected)$/).waitFor({ timeout: 30_000 });
    await rowOf(page, 'n16').getByText('256 rows').waitFor({ timeout: 30_000 });
    const { grids } = await ok(person, getStudyContract, { params: { id: study.id } });
    expect(grids.map(({ upload }) => [upload?.filename, upload?.bytes]).sort()).toEqual([["n16 – Größe 100% #1 & 'b'.csv", part], ['n8.csv', 1]]);
  });
});
