import { execFile } from 'node:child_process';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getMatrixContract } from '@/lib/domain/matrix/schema';
import { createStudyContract, getGridResultContract, getOutcomeContract, getStudyContract } from '@/lib/domain/studies/schema';
import { previewContract } from '@/lib/domain/uploads/schema';
import { adminDatabase } from '../support/admin-database';
import { addressOf, headersOf, ok } from '../support/api';
import { need } from '../support/environment';
import { startWeb, type ExtraProcess } from '../support/extra-process';
import { heatSizes, heatTable } from '../support/grids';
import { signUp, type Person } from '../support/people';
import { askSecondHome, makeSecondHome } from '../support/second-home';
import { awaitOutcome, awaitStudy, putFile } from '../support/study';
import { makeWork } from '../support/work';

const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'fourfold-backup-'));
const port = Number(new URL(need('WEB_URL')).port) + 30;
let engineer: Person;
let study = '';
let upload = '';
let objectKey = '';
let home: Record<string, string> = {};
let web: ExtraProcess | undefined;

interface Ended { status: number; said: string }

function command(name: 'backup' | 'restore', env: Record<string, string> = {}): Promise<Ended> {
  const program = path.join(need('TEST_BUILD_FOLDER'), `worker/commands/${name}.mjs`);
  return new Promise((resolve) => {
    execFile(process.execPath, [program, folder], { env: { ...process.env, ...env } }, (error, stdout, stderr) => {
      resolve({ status: typeof error?.code === 'number' ? error.code : 0, said: stdout + stderr });
    });
  });
}

beforeAll(async () => {
  engineer = await signUp('Backup');
  const work = await makeWork(engineer);
  ({ id: study } = await ok(engineer, createStudyContract, {
    body: { case: work.case.slug, release: '1.0.0', grids: heatSizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n })) },
  }));
  for (const n of heatSizes) ({ id: upload } = await putFile(engineer, { id: study, label: `n${n}` }, heatTable(n)));
  await awaitOutcome(engineer, study);
  await awaitStudy(engineer, study, ({ state }) => state === 'assessed');
  objectKey = `${engineer.at.id}/${study}/${upload}`;
  home = await makeSecondHome('fourfold_restored');
});

afterAll(async () => {
  await web?.end();
  fs.rmSync(folder, { recursive: true, force: true });
});

const objectFile = () => path.join(folder, 'objects', objectKey);

function damage(): void {
  const bytes = fs.readFileSync(objectFile());
  bytes[100] = (bytes[100] ?? 0) ^ 1;
  fs.writeFileSync(objectFile(), bytes);
}

describe('npm run backup', () => {
  it('takes the database and every file, with a manifest of their hashes', async () => {
    const { status, said } = await command('backup');
    expect(status, said).toBe(0);
    const manifest = JSON.parse(fs.readFileSync(path.join(folder, 'manifest.json'), 'utf8')) as { tables: Record<string, number>; objects: { count: number }; missing: string[] };
    expect(manifest.missing).toEqual([]);
    expect(manifest.tables.grid_results).toBeGreaterThanOrEqual(heatSizes.length);
    expect(manifest.objects.count).toBeGreaterThanOrEqual(heatSizes.length);
    expect(fs.readFileSync(objectFile())).toEqual(heatTable(64));
  });

  it('copies no file that is there already', async () => {
    const { status, said } = await command('backup');
    expect(status, said).toBe(0);
    expect(said).toMatch(/\(0 copied, \d+ already there/);
  });
});

describe('npm run restore', () => {
  it('names a damaged file and restores nothing', async () => {
    damage();
    const { status, said } = await command('restore', home);
    expect(status).not.toBe(0);
    expect(said).toContain('The backup is damaged, and nothing was restored.');
    expect(said).toContain(`objects/${objectKey} is damaged: its SHA-256 is `);
  });

  it('restores a backup that the next run has mended', async () => {
    const backup = await command('backup');
    expect(backup.said).toMatch(/\(1 copied, /);
    const { status, said } = await command('restore', home);
    expect(said).toMatch(/Restored the backup of .*: schema \d{4}-/);
    expect(status, said).toBe(0);
  });

  it('gives the same answers and the same page', async () => {
    web = await startWeb('web-restored', port, { ...home, REDIS_URL: `${need('REDIS_URL')}/1` });
    const calls = [
      [getStudyContract, { id: study }], [getOutcomeContract, { id: study }], [getGridResultContract, { id: study, label: 'n64' }], [previewContract, { id: upload }],
      [getMatrixContract, { code: 'brack' }],
    ] as const;
    const read = async (base: string, address: string) => {
      const response = await fetch(`${base}${address}`, { headers: headersOf(getStudyContract, engineer) });
      expect(response.status, address).toBe(200);
      return response.text();
    };
    const pageText = (html: string) => (/<main[\s\S]*<\/main>/.exec(html)?.[0] ?? '').replace(/<script[\s\S]*?<\/script>|<style[\s\S]*?<\/style>|<[^>]+>/g, ' ').replace(/\s+/g, ' ');
    for (const [contract, params] of calls) {
      const address = addressOf(contract, { params }, engineer);
      expect(await read(`http://127.0.0.1:${port}`, address)).toEqual(await read(need('WEB_URL'), address));
    }
    const page = `/${engineer.at.slug}/studies/${study}`;
    const restored = pageText(await read(`http://127.0.0.1:${port}`, page));
    expect(restored).toContain('n64');
    expect(restored).toBe(pageText(await read(need('WEB_URL'), page)));
  });

  it('keeps roles, rights and row-level security', async () => {
    const catalogue = [
      "select relname, relrowsecurity, relforcerowsecurity, relowner::regrole::text, relacl::text from pg_class where relnamespace = 'public'::regnamespace and relkind = 'r' order by 1",
      'select tablename, policyname, roles::text, cmd, qual, with_check from pg_policies order by 1, 2',
      "select proname, proowner::regrole::text, prosecdef, proacl::text from pg_proc where pronamespace = 'public'::regnamespace order by 1",
    ];
    const there = await askSecondHome(home.TEST_ADMIN_DATABASE_URL ?? '', catalogue);
    for (const [index, query] of catalogue.entries()) {
      expect(there[index]?.length).toBeGreaterThan(3);
      expect(there[index]).toEqual((await adminDatabase().query<object>(query)).rows);
    }
    expect(await askSecondHome(home.DATABASE_URL ?? '', ['select 1 from codes'])).toEqual([[]]);
    await expect(askSecondHome(home.DATABASE_URL ?? '', ['delete from assessments'])).rejects.toThrow('permission denied');
  });

  it('refuses where anything is', async () => {
    const { status, said } = await command('restore', home);
    expect(status).not.toBe(0);
    expect(said).toContain('The database is not empty');
  });
});
