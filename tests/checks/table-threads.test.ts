import { execFileSync } from 'node:child_process';
import { mkdtempSync, openSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { bundleReading } from '../bench/bundle.mjs';

const cells = 50;
const folder = mkdtempSync(path.join(os.tmpdir(), 'table-threads-'));
const file = path.join(folder, 'structured.csv');
let program = '';

beforeAll(async () => {
  program = await bundleReading();
  execFileSync(process.execPath, ['tests/bench/generate.mjs', String(cells)], { stdio: ['ignore', openSync(file, 'w'), 'inherit'] });
});
afterAll(() => rmSync(folder, { recursive: true }));

const print = (threads: number) => execFileSync(process.execPath, [program, file, '--threads', String(threads)], { encoding: 'utf8' });

describe('the bundled reading of a table', () => {
  it('prints the norms that were put in, and the same digits with one thread and two', () => {
    const alone = print(1);
    expect(print(2)).toBe(alone);
    const [head, rho, u] = alone.split('\n');
    expect(head).toContain(`${cells ** 3} rows`);
    // Over cell centres the mean of 1 + xyz/2 is 17/16.
    expect(Number(rho?.split(/\s+/)[1]) / ((0.7 * 17) / 16 / cells ** 2)).toBeCloseTo(1, 11);
    expect(Number(u?.split(/\s+/)[1]) / ((300 * 17) / 16 / cells ** 2)).toBeCloseTo(1, 11);
  });
});
