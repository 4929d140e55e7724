import { describe, expect, it } from 'vitest';
import { gzipSync } from 'node:zlib';
import type { GridPart } from '@/lib/readers/grid-task';
import type { OpenHelper } from '@/lib/readers/table/chunk-helping';
import { createGridChecks } from '@/lib/readers/grid-checks';
import type { GridReading } from '@/lib/readers/grid-reading';
import { readGrid } from '@/lib/readers/read-grid';
import { RejectedFile } from '@/lib/readers/rejected-file';
import { createTableMemory } from '@/lib/readers/table/table-memory';
import { createTableWork, type TableTask } from '@/lib/readers/table/table-work';
import { byteSource } from '@/tests/support/byte-source';

const reading: GridReading = {
  mapping: { x: 'x', y: 'y', weight: 'w', fields: { u: 'u', v: 'v' } },
  problem: { dimension: 2, exact: { u: 'sin(3*x)*cos(2*y)', v: 'exp(x)*u+y' }, constants: {} },
  fields: [{ field: 'u' }, { field: 'v' }],
};

const rows = Array.from({ length: 90_000 }, (_, i) => {
  const x = (i % 250) / 250;
  const y = Math.floor(i / 250) / 360;
  const u = Math.sin(3 * x) * Math.cos(2 * y) + 1e-3 * Math.sin(i);
  return [x, y, 1 + (i % 7) / 10, u, Math.exp(x) * u + y].join(',');
});

/** A column that nobody asks for makes the rows longer, and so the chunks more. */
const note = 'n'.repeat(120);

/** `rows` with some of them, counted from 0, replaced. */
function table(changes: Record<number, string> = {}): Buffer {
  const changed = rows.map((row, index) => `${changes[index] ?? row},${note}`);
  return Buffer.from(`x,y,w,u,v,note\n${changed.join('\n')}\n`);
}

/** Reads ahead in this thread, and answers late. */
function lateHelper(reads: number[]): (task: TableTask) => OpenHelper<GridPart> {
  return (task) => (shared) => {
    const memory = createTableMemory(shared);
    const work = createTableWork(task, createGridChecks(undefined), memory);
    return Promise.resolve({
      async readAhead(room, length) {
        reads.push(room);
        const result = work.readAhead(memory.bytes(shared.rooms[room] as number, length));
        await new Promise((resolve) => setTimeout(resolve, (reads.length * 7) % 5));
        return structuredClone(result);
      },
      close: () => Promise.resolve(),
    });
  };
}

async function reasonsOf(content: Buffer, openHelper?: (task: TableTask) => OpenHelper<GridPart>) {
  try {
    await readGrid(byteSource(content, [1_000_000, 2_000_000]), reading, { openHelper });
    return [];
  } catch (error) {
    if (error instanceof RejectedFile) return error.reasons;
    throw error;
  }
}

describe('a large text table', () => {
  it('comes to the same bits however it is cut, packed, and whoever reads it', async () => {
    const content = table();
    const { norms } = await readGrid(byteSource(content), reading);
    expect(norms).toMatchObject({ rows: 90_000, fields: [{ significantDigits: 17 }, { significantDigits: 17 }] });
    const cuts = Array.from({ length: 400 }, (_, i) => (i * 99_991) % content.length);
    expect((await readGrid(byteSource(content, cuts), reading)).norms).toStrictEqual(norms);
    expect((await readGrid(byteSource(gzipSync(content, { level: 1 })), reading)).norms).toStrictEqual(norms);
    const reads: number[] = [];
    expect((await readGrid(byteSource(content, cuts), reading, { openHelper: lateHelper(reads) })).norms).toStrictEqual(norms);
    expect(reads.length).toBeGreaterThan(3);
  });

  it('agrees with sums over its rows', async () => {
    const { norms } = await readGrid(byteSource(table()), reading);
    const weights = rows.map((_, i) => 1 + (i % 7) / 10);
    const sum = rows.reduce((total, _, i) => total + 10 + (i % 7), 0) / 10;
    const absolute = rows.reduce((total, _, i) => total + (weights[i] as number) * Math.abs(1e-3 * Math.sin(i)), 0);
    expect(norms.weightSum / sum).toBeCloseTo(1, 13);
    expect((norms.fields[0]?.L1 ?? 0) / (absolute / sum)).toBeCloseTo(1, 9);
  });

  it('is rejected for the same reasons in the same places with a helper', async () => {
    const damaged = table({
      500: '0,0,1,0.5,two', 20_000: '0,0,-1,0,1', 45_000: '0,0,1,nan,1', 50_001: '0,0,0,0,1', 55_000: '"0",0,1,0.5,"1"', 59_000: '0,0', 89_999: '0,0,1,0.5,zwei',
    });
    const expected = [
      { code: 'not-a-number', count: 2, line: 502, column: 5, found: 'two' },
      { code: 'not-finite', count: 1, line: 45_002, column: 4, found: 'nan' },
      { code: 'short-row', count: 1, line: 59_002 },
      { code: 'weight-not-positive', count: 2, line: 20_002, column: 3, found: '-1' },
    ];
    expect(await reasonsOf(damaged)).toMatchObject(expected);
    expect(await reasonsOf(damaged, lateHelper([]))).toMatchObject(expected);
    const lateOnly = table({ 72_000: '0,0,1,nan,1', 78_000: '0,0,0,0,1' });
    const reads: number[] = [];
    expect(await reasonsOf(lateOnly, lateHelper(reads))).toMatchObject([{ code: 'not-finite', line: 72_002 }, { code: 'weight-not-positive', line: 78_002 }]);
    expect(reads.length).toBeGreaterThan(3);
  });

  it('names the line in which its decimal mark was first seen', async () => {
    const pad = ' '.repeat(180);
    const semicolons = (comma: number) => {
      const lines = rows.map((_, i) => `${pad}${i % 10};0;1;${i < 40_000 ? '0' : i === comma ? '0,5' : '0.5'};1`);
      return Buffer.from(`x;y;w;u;v\n${lines.join('\n')}\n`);
    };
    const expected = [{ code: 'mixed-decimal', count: 1, line: 50_002, column: 4, found: '0,5', expected: 'a decimal point, as from line 40002 on' }];
    expect(await reasonsOf(semicolons(50_000), lateHelper([]))).toEqual(expected);
    expect(await reasonsOf(semicolons(50_000))).toEqual(expected);
  });

  it('fails where its helper fails', async () => {
    const failing = () => () => Promise.resolve({ readAhead: () => Promise.reject(new Error('the thread ended')), close: () => Promise.resolve() });
    await expect(readGrid(byteSource(table(), [3_500_000]), reading, { openHelper: failing })).rejects.toThrow('the thread ended');
  });
});
