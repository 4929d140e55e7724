import { gzipSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { readPreview } from '@/lib/readers/read-preview';
import { readGrid } from '@/lib/readers/read-grid';
import { RejectedFile } from '@/lib/readers/rejected-file';
import type { ByteSource } from '@/lib/readers/source';
import type { RejectionReason } from '@/lib/domain/uploads/rejection';
import { byteSource } from '@/tests/support/byte-source';

const reading = {
  mapping: { x: 'x', weight: 'w', fields: { u: 'u' } }, problem: { dimension: 1, exact: { u: 'x' }, constants: {} }, fields: [{ field: 'u' }],
} as const;

async function reasonsOf(work: Promise<unknown>): Promise<RejectionReason[]> {
  const fault: unknown = await work.then(() => null, (error: unknown) => error);
  if (!(fault instanceof RejectedFile)) throw fault instanceof Error ? fault : new Error('The file was taken.');
  return fault.reasons;
}

const read = (source: ByteSource) => readGrid(source, { ...reading, mapping: { ...reading.mapping } });
const header = gzipSync('x,w,u\n');
/** A megabyte of one row after another, which takes about a kilobyte. */
const member = gzipSync('1,2,3\n'.repeat(170_000));

describe('a compressed file', () => {
  it('of several members is read as one', async () => {
    const { norms } = await read(byteSource(Buffer.concat([header, gzipSync('1,1,1\n2,1,2\n'), gzipSync('3,1,3\n')])));
    expect(norms.rows).toBe(3);
  });

  it('that expands a thousand times is given up, before all of it has come out', async () => {
    let taken = 0;
    async function* bomb(): AsyncGenerator<Uint8Array> {
      yield header;
      for (; taken < 100_000; taken += 1) yield await Promise.resolve(member);
    }
    expect(await reasonsOf(read(bomb()))).toEqual([expect.objectContaining({ code: 'expands-too-far', found: expect.stringMatching(/^more than 6\d MB/) as string })]);
    expect(taken).toBeLessThan(150);
  });

  it('inside a compressed file is refused by name', async () => {
    const nested = gzipSync(gzipSync('x,w,u\n1,1,1\n'));
    const expected = [expect.objectContaining({ code: 'unsupported-format', found: 'a compressed file inside another' })];
    expect(await reasonsOf(read(byteSource(nested)))).toEqual(expected);
    expect(await reasonsOf(readPreview(byteSource(nested)))).toEqual(expected);
  });
});

describe('a file beyond bounds', () => {
  it('has more columns than are read', async () => {
    const names = Array.from({ length: 100_001 }, (_, index) => `a${index}`);
    const expected = [expect.objectContaining({ code: 'too-many-columns', found: '100001 columns or more' })];
    expect(await reasonsOf(readPreview(byteSource(`${names.join(',')}\n`)))).toEqual(expected);
    expect(await reasonsOf(readPreview(byteSource(JSON.stringify(Object.fromEntries(names.map((name) => [name, []]))))))).toEqual(expected);
  });

  it('nests lists without end', async () => {
    expect(await reasonsOf(readPreview(byteSource(`{"x":${'['.repeat(1000)}`))))
      .toEqual([expect.objectContaining({ code: 'malformed-json', found: 'more than 64 lists inside each other' })]);
  });

  it('shows no more of a long text than its beginning', async () => {
    const { firstRows } = await readPreview(byteSource(JSON.stringify({ x: ['a'.repeat(60_000)] })));
    expect(firstRows).toEqual([['a'.repeat(200)]]);
  });
});
