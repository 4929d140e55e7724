import { createHash } from 'node:crypto';
import { gzipSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import type { GridReading } from '@/lib/readers/grid-reading';
import { readGrid } from '@/lib/readers/read-grid';
import { RejectedFile } from '@/lib/readers/rejected-file';
import { byteSource } from '@/tests/support/byte-source';

const reading: GridReading = {
  mapping: { x: 'x', weight: 'w', fields: { u: 'u' } },
  problem: { dimension: 1, exact: { u: 'a*x' }, constants: { a: 2 } },
  fields: [{ field: 'u' }],
};

async function reasonsOf(content: string, changes: Partial<GridReading> = {}) {
  try {
    await readGrid(byteSource(content), { ...reading, ...changes });
    return [];
  } catch (error) {
    if (error instanceof RejectedFile) return error.reasons;
    throw error;
  }
}

describe('readGrid(source, reading)', () => {
  it('gives norms by weight, and the hash and size of the bytes as stored', async () => {
    const stored = gzipSync('x,w,u\n0,1,0.1\n1,3,2.2\n');
    const { norms, sha256, bytes } = await readGrid(byteSource(stored, [1, 2, 7]), reading);
    expect(norms).toMatchObject({ rows: 2, weightSum: 4, equalWeights: false });
    expect(norms.fields[0]?.L1).toBeCloseTo((0.1 + 3 * 0.2) / 4, 14);
    expect(norms.fields[0]).toMatchObject({ at: { x: 1 }, significantDigits: 2, count: 2, min: 0.1, max: 2.2, maxAbs: 2.2 });
    expect({ sha256, bytes }).toEqual({ sha256: createHash('sha256').update(stored).digest('hex'), bytes: stored.length });
  });

  it('weighs every row the same only where told', async () => {
    const { norms } = await readGrid(byteSource('x,u\n0,0.5\n1,2.5\n'), { ...reading, mapping: { ...reading.mapping, weight: null } });
    expect(norms).toMatchObject({ rows: 2, weightSum: 2, equalWeights: true, fields: [{ L1: 0.5, L2: 0.5, Linf: 0.5, mean: 0.5 }] });
  });

  it('compares a field with an expression of the exact fields, a derivative too', async () => {
    const { norms } = await readGrid(byteSource('x,w,q\n0,1,-3\n1,1,-3\n'), {
      ...reading, mapping: { x: 'x', weight: 'w', fields: { q: 'q' } },
      fields: [{ field: 'q', compare: '-k*d(u, x)' }], problem: { ...reading.problem, constants: { a: 2, k: '3/a' } },
    });
    expect(norms.fields[0]?.Linf).toBe(0);
  });

  it('rejects a column of another time than the grid states, but for what printing lost', async () => {
    const timed = { mapping: { ...reading.mapping, t: 't' }, problem: { ...reading.problem, exact: { u: 'a*x+t' } } };
    expect(await reasonsOf('x,w,t,u\n0,1,0.3333333,0.3\n1,1,0.3333333,2.3\n', { ...timed, t: 1 / 3 })).toEqual([]);
    expect(await reasonsOf('x,w,t,u\n0,1,0.7,0.7\n1,1,0.5,2.5\n2,1,0.5,4.5\n', { ...timed, t: 0.7 })).toEqual([
      { code: 'time-differs', count: 2, line: 3, column: 3, found: '0.5', expected: '0.7, the time stated for the grid' },
    ]);
    expect(await reasonsOf('{"x":[0,1],"w":[1,1],"t":[0,1e-6],"u":[0,2]}', { ...timed, t: 0 }))
      .toMatchObject([{ code: 'time-differs', count: 1, line: null, column: 3, found: '0.000001 in row 2' }]);
  });

  it('takes the time of the grid, or of a column', async () => {
    const problem = { ...reading.problem, exact: { u: 'a*x+t' } };
    const byGrid = await readGrid(byteSource('x,w,u\n0,1,5\n1,1,7\n'), { ...reading, problem, t: 5 });
    expect(byGrid.norms.fields[0]?.Linf).toBe(0);
    const byColumn = await readGrid(byteSource('x,w,time,u\n0,1,5,5\n1,1,6,8\n'), { ...reading, problem, mapping: { ...reading.mapping, t: 'time' } });
    expect(byColumn.norms.fields[0]?.Linf).toBe(0);
  });

  it('names line and column of a weight that is not positive, beside what else is wrong', async () => {
    expect(await reasonsOf('x,w,u\n0,1,0\n1,0,two\n# note\n2,-1,4\n3,0,6\n')).toEqual([
      { code: 'not-a-number', count: 1, line: 3, column: 3, found: 'two', expected: 'a finite number' },
      { code: 'weight-not-positive', count: 2, line: 5, column: 2, found: '-1', expected: 'a weight above 0' },
    ]);
  });

  it('names line and point where the exact solution is not finite', async () => {
    const problem = { ...reading.problem, exact: { u: '1/x' }, constants: {} };
    expect(await reasonsOf('x,w,u\n1,1,1\n0,1,2\n', { problem })).toEqual([{
      code: 'exact-not-finite', count: 1, line: 3, column: null, found: 'Infinity for u at x = 0', expected: 'an exact solution that is finite at every row',
    }]);
  });

  it('throws for a mapping without the column of a field, and for an expression that is not valid', async () => {
    await expect(readGrid(byteSource('x,w\n0,1\n'), { ...reading, fields: [{ field: 'v', compare: 'u' }] })).rejects.toThrow('the mapping has no column for v');
    await expect(readGrid(byteSource('x,w,u\n0,1,1\n'), { ...reading, problem: { ...reading.problem, constants: {} } })).rejects.toThrow('The name “a” is not known');
  });

  it('stops where it is told to', async () => {
    await expect(readGrid(byteSource('x,w,u\n0,1,1\n'), reading, { signal: AbortSignal.abort() })).rejects.toThrow(/abort/i);
  });

  it('tells how far it is', async () => {
    const seen: unknown[] = [];
    const content = `x,w,u\n${'0.5,1,1\n'.repeat(20_000)}`;
    await readGrid(byteSource(content, [80_000]), reading, { onProgress: (progress) => seen.push(progress) });
    expect(seen.at(-1)).toEqual({ rows: 20_000, bytes: content.length });
  });
});
