import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { expect } from 'vitest';
import { browserTest } from '@/tests/support/browser';
import { heatTable } from '@/tests/support/grids';
import { signUp } from '@/tests/support/people';
import { createStudyContract } from '@/lib/domain/studies/schema';
import { ok } from '@/tests/support/api';
import { makeWork } from '@/tests/support/work';

const bytesPerSecond = 10e6;

browserTest('a large file can be paused, and goes on after the page was left from the parts that are stored', async ({ open }) => {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'fourfold-'));
  const file = path.join(folder, 'heat_768.csv');
  fs.writeFileSync(file, heatTable(768));
  const other = path.join(fs.mkdtempSync(path.join(os.tmpdir(), 'fourfold-')), 'heat_768.csv');
  fs.writeFileSync(other, heatTable(64));
  expect(fs.statSync(file).size).toBeGreaterThan(40 * 1024 * 1024);
  const person = await signUp();
  const work = await makeWork(person);
  const grids = [{ label: 'n16', cellsPerDirection: 16 }, { label: 'n768', cellsPerDirection: 768 }];
  const study = await ok(person, createStudyContract, { body: { case: work.case.slug, release: work.release.version, grids } });
  const page = await open(`/${person.at.slug}/studies/${study.id}`, { person });
  const network = await page.context().newCDPSession(page);
  await network.send('Network.enable');
  await network.send('Network.emulateNetworkConditions', { offline: false, latency: 0, downloadThroughput: -1, uploadThroughput: bytesPerSecond });
  let sentParts = 0;
  page.on('request', (request) => { if (request.method() === 'PUT') sentParts += 1; });

  await page.locator('input[type=file]').setInputFiles(file);
  const row = page.getByRole('row', { name: /^n768/ });
  await row.getByText(/\/s, \d+\ss left$/).waitFor({ timeout: 30_000 });
  await page.getByRole('button', { name: 'Pause, grid n768' }).click();
  await row.getByText('paused').waitFor();
  await page.getByRole('button', { name: 'Resume, grid n768' }).click();
  await row.getByText(/^(17|25)\sMB of/).waitFor({ timeout: 30_000 });

  await page.reload();
  await row.getByText('half sent').waitFor();
  await page.locator('input[type=file]').setInputFiles(other);
  await page.getByText('heat_768.csv is another file than the one half sent.').waitFor();
  await page.getByRole('button', { name: 'Keep the one half sent' }).click();
  sentParts = 0;
  await page.locator('input[type=file]').setInputFiles(file);
  await row.getByText('read', { exact: true }).waitFor({ timeout: 60_000 });
  await row.getByText(/^589\s824 rows$/).waitFor();
  expect(sentParts).toBeLessThan(5);
  fs.rmSync(folder, { recursive: true });
});
