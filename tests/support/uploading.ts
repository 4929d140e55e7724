import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import type { CDPSession, Page } from 'playwright-core';
import { createStudyContract, type Study } from '@/lib/domain/studies/schema';
import { ok } from './api';
import { heatTable } from './grids';
import type { Person } from './people';
import { makeWork } from './work';

/** A table for grid n16 with comments behind it, so that it takes several parts and is read in no time. */
export const bigTable = (megabytes: number): Buffer => Buffer.concat([heatTable(16), Buffer.from(`# ${'-'.repeat(97)}\n`.repeat(megabytes * 10_000))]);

/** A file on disk in a folder of its own, under the system's folder for what is temporary. */
export function fileOf(name: string, content: Buffer | string): string {
  const file = path.join(fs.mkdtempSync(path.join(os.tmpdir(), 'fourfold-')), name);
  fs.writeFileSync(file, content);
  return file;
}

export async function makeUploadStudy(person: Person): Promise<Study> {
  const work = await makeWork(person);
  const grids = [8, 16].map((n) => ({ label: `n${n}`, cellsPerDirection: n }));
  return ok(person, createStudyContract, { body: { case: work.case.slug, release: work.release.version, grids } });
}

export const rowOf = (page: Page, grid: string) => page.getByRole('row', { name: new RegExp(`^${grid}\\b`) });
export const fileInput = (page: Page) => page.locator('input[type=file]');

/** The line of the page: so many bytes a second, or none. */
export async function throttle(page: Page, uploadThroughput: number): Promise<{ set: (bytes: number | 'offline') => Promise<void> }> {
  const network: CDPSession = await page.context().newCDPSession(page);
  await network.send('Network.enable');
  const set = async (bytes: number | 'offline') => {
    await network.send('Network.emulateNetworkConditions', {
      offline: bytes === 'offline', latency: 0, downloadThroughput: -1, uploadThroughput: bytes === 'offline' ? -1 : bytes,
    });
  };
  await set(uploadThroughput);
  return { set };
}
