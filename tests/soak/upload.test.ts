import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { expect } from 'vitest';
import { formatBytes } from '@/lib/domain/numbers/format-bytes';
import { getStudyContract } from '@/lib/domain/studies/schema';
import { adminDatabase } from '@/tests/support/admin-database';
import { ok } from '@/tests/support/api';
import { browserTest } from '@/tests/support/browser';
import { need } from '@/tests/support/environment';
import { heatTable } from '@/tests/support/grids';
import { watchMemory } from '@/tests/support/memory';
import { signUp } from '@/tests/support/people';
import { fileInput, makeUploadStudy, rowOf } from '@/tests/support/uploading';

const bytes = Number(process.env.BYTES ?? 5e9);
/** What each may have at its peak above its beginning, whatever the size of the file. */
const mostGrowth = { browser: 200e6, renderer: 150e6, web: 100e6, worker: 200e6 };
const hours = 3_600_000;

/** A table of whole rows repeated up to the size, with its header once. */
function writeTable(file: string): void {
  const [header = '', ...rows] = heatTable(256).toString().trimEnd().split('\n');
  const block = Buffer.from(`${rows.join('\n')}\n`);
  const opened = fs.openSync(file, 'w');
  let written = fs.writeSync(opened, `${header}\n`);
  while (written + block.length <= bytes) written += fs.writeSync(opened, block);
  written += fs.writeSync(opened, block.subarray(0, block.lastIndexOf('\n', bytes - written - 1) + 1));
  fs.writeSync(opened, '\n'.repeat(bytes - written));
  fs.closeSync(opened);
}

browserTest(`a file of ${formatBytes(bytes)} is sent and read with memory that does not grow with it`, async ({ open }) => {
  const folder = fs.mkdtempSync(path.join(process.env.SOAK_FOLDER ?? os.tmpdir(), 'fourfold-soak-'));
  try {
    const file = path.join(folder, 'n16.csv');
    writeTable(file);
    expect(fs.statSync(file).size).toBe(bytes);
    const person = await signUp('Soak');
    await adminDatabase().query('update organisations set storage_quota_bytes = $2 where id = $1', [person.at.id, 2 * bytes + 1e9]);
    const study = await makeUploadStudy(person);
    const page = await open(`/${person.at.slug}/studies/${study.id}`, { person });
    const memory = watchMemory({ browserOf: process.pid, pidFolder: need('TEST_PID_FOLDER') });
    const begun = performance.now();
    await fileInput(page).setInputFiles(file);
    const row = rowOf(page, 'n16');
    await row.getByText(/^(waits to be read|reading)$/).waitFor({ timeout: hours });
    const sent = performance.now();
    await row.getByText('read', { exact: true }).waitFor({ timeout: hours });
    const read = performance.now();
    const peaks = memory.stop();

    const { grids } = await ok(person, getStudyContract, { params: { id: study.id } });
    const upload = grids.find(({ label }) => label === 'n16')?.upload;
    expect(upload).toMatchObject({ bytes });
    const seconds = (from: number, to: number) => `${((to - from) / 1000).toFixed(1)} s`;
    const lines = [
      ['file', `${formatBytes(bytes)}, ${upload?.rows} rows`], ['sent in', seconds(begun, sent)], ['read in', seconds(sent, read)],
      ...Object.entries(peaks).map(([name, { first, peak }]) => [name, `${formatBytes(first)} at first, ${formatBytes(peak)} at most`]),
    ];
    process.stdout.write(`${lines.map(([name = '', value]) => `${name.padEnd(10)}${value}`).join('\n')}\n`);
    for (const [name, most] of Object.entries(mostGrowth)) {
      const { first, peak } = peaks[name as keyof typeof mostGrowth];
      expect(peak - first, `growth of ${name}`).toBeLessThan(most);
    }
  } finally {
    fs.rmSync(folder, { recursive: true, force: true });
  }
});
