import fc from 'fast-check';
import fs from 'node:fs';
import { describe, expect, it } from 'vitest';
import { createColumnStore, deliverColumns } from '@/lib/readers/column-store';
import { openTemporaryFile, writeTemporaryFile } from '@/lib/readers/temporary-file';
import { byteSource } from '@/tests/support/byte-source';

const isSame = (a: Float64Array, b: Float64Array) => Buffer.from(a.buffer).equals(Buffer.from(b.buffer));

/** Files without a name that this process holds open. */
const listOpenFiles = () => fs.readdirSync('/proc/self/fd').filter((name) => {
  try {
    return fs.readlinkSync(`/proc/self/fd/${name}`).includes('fourfold-');
  } catch {
    // The folder itself was open while it was listed.
    return false;
  }
});
const openFiles = () => listOpenFiles().length;

describe('createColumnStore(mostHeld)', () => {
  it('gives back every value, whatever memory it may take and in whatever order columns grow', () => {
    const turns = fc.array(fc.tuple(fc.nat(3), fc.integer({ min: 1, max: 20_000 })), { maxLength: 12 });
    fc.assert(fc.property(turns, fc.constantFrom(0, 100, 10_000, 1e6), (grown, mostHeld) => {
      const store = createColumnStore(mostHeld);
      try {
        const columns = Array.from({ length: 4 }, () => store.addColumn());
        const expected: number[][] = columns.map(() => []);
        for (const [at, count] of grown) {
          const values = Float64Array.from({ length: count }, (_, i) => Math.sin(i + count) * 1e3);
          if (count % 2 === 0) columns[at]?.addAll(values, count);
          else values.forEach((value) => columns[at]?.add(value));
          expected[at]?.push(...values);
        }
        for (const [at, column] of columns.entries()) {
          const all = Float64Array.from(expected[at] ?? []);
          const into = new Float64Array(all.length);
          column.copy(0, all.length, into);
          expect(isSame(into, all)).toBe(true);
          const part = all.slice(Math.floor(all.length / 3), Math.floor(all.length / 3) + 9000);
          const found = new Float64Array(part.length);
          column.copy(Math.floor(all.length / 3), part.length, found);
          expect(isSame(found, part)).toBe(true);
        }
      } finally {
        store.close();
      }
    }), { numRuns: 40 });
    expect(openFiles()).toBe(0);
  });

  it('holds so much in memory and puts the rest on disk, until it is closed', () => {
    const store = createColumnStore(20_000);
    const column = store.addColumn();
    for (let i = 0; i < 16_000; i += 1) column.add(i);
    expect(openFiles()).toBe(0);
    for (let i = 0; i < 20_000; i += 1) column.add(i);
    expect(openFiles()).toBe(1);
    store.close();
    expect(openFiles()).toBe(0);
  });

  it('writes large blocks to disk also of a column that begins once memory is full', () => {
    const store = createColumnStore(0);
    const column = store.addColumn();
    for (let i = 0; i < 100_000; i += 1) column.add(i);
    expect(listOpenFiles().map((name) => fs.fstatSync(Number(name)).size)).toEqual([12 * 8192 * 8]);
    store.close();
  });

  it('delivers rows of all columns together', () => {
    const store = createColumnStore(1000);
    const columns = [store.addColumn(), store.addColumn()];
    for (let i = 0; i < 5000; i += 1) columns.forEach((column, at) => column.add(at === 0 ? i : -i));
    const rows: number[][] = [];
    deliverColumns(columns, 5000, ({ rows: count, columns: [first, second] }) => {
      for (let i = 0; i < count; i += 1) rows.push([first?.[i] ?? NaN, second?.[i] ?? NaN]);
    });
    expect(rows).toEqual(Array.from({ length: 5000 }, (_, i) => [i, -i]));
    store.close();
  });

  it('throws for rows it does not have', () => {
    const store = createColumnStore();
    const column = store.addColumn();
    column.add(1);
    expect(() => column.copy(0, 2, new Float64Array(2))).toThrow('Rows 0 to 2 of a column of 1');
    store.close();
  });
});

describe('writeTemporaryFile(pieces, onPiece)', () => {
  it('keeps the bytes of all pieces', async () => {
    const file = await writeTemporaryFile(byteSource('one two three', [4, 8]), () => undefined);
    const into = Buffer.alloc(5);
    file.read(into, 8);
    expect([file.size(), into.toString()]).toEqual([13, 'three']);
    expect(() => file.read(into, 10)).toThrow('was read at 13');
    file.close();
    file.close();
    expect(openFiles()).toBe(0);
  });

  it('leaves nothing where the pieces end in an error', async () => {
    async function* failing(): AsyncGenerator<Uint8Array> {
      yield Buffer.from('x');
      await Promise.reject(new Error('storage is away'));
    }
    await expect(writeTemporaryFile(failing(), () => undefined)).rejects.toThrow('storage is away');
    expect(openFiles()).toBe(0);
  });

  it('has no name that could be left behind', () => {
    const file = openTemporaryFile();
    expect(fs.readlinkSync(`/proc/self/fd/${file.descriptor}`)).toContain('(deleted)');
    file.close();
  });
});
