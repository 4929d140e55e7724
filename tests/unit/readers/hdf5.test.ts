import fc from 'fast-check';
import { Readable } from 'node:stream';
import { gzipSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { readHdf5 } from '@/lib/readers/hdf5/read-hdf5';
import { readGrid } from '@/lib/readers/read-grid';
import { readPreview } from '@/lib/readers/read-preview';
import { createReasonCollector } from '@/lib/readers/reason-collector';
import { byteSource } from '@/tests/support/byte-source';
import { writeHdf5 } from '@/tests/support/hdf5';
import { readReasons, readTable } from '@/tests/support/read-table';

const doubles = (count: number, of: (i: number) => number = Math.sin) => Float64Array.from({ length: count }, (_, i) => of(i));
const xu = [{ path: 'mesh/x', data: Float64Array.of(0, 1, 2) }, { path: 'fields/u', data: Float64Array.of(1.5, -2e-3, 0) }];

describe('native HDF5', () => {
  it('says of a field that it is stored in single precision', async () => {
    const bytes = await writeHdf5([{ path: 'x', data: doubles(4) }, { path: 'u', data: Float32Array.of(1, 2, 3, 4) }, { path: 'v', data: doubles(4) }]);
    const { norms } = await readGrid(byteSource(bytes), {
      mapping: { x: 'x', weight: null, fields: { u: 'u', v: 'v' } }, problem: { dimension: 1, exact: { u: 'x', v: 'x' }, constants: {} }, fields: [{ field: 'u' }, { field: 'v' }],
    });
    expect(norms.fields.map(({ storedAs, significantDigits }) => [storedAs, significantDigits])).toEqual([['single', null], [undefined, null]]);
  });

  it('is read by path, also packed and behind a block of the user', async () => {
    const bytes = await writeHdf5(xu);
    for (const content of [bytes, gzipSync(bytes), Buffer.concat([Buffer.alloc(512), bytes]), Buffer.concat([Buffer.from('# note\n'.padEnd(2048, '.')), bytes])]) {
      expect(await readTable(content, ['x', 'u'], [3, 700])).toMatchObject({ columns: [[0, 1, 2], [1.5, -2e-3, 0]], digits: [null, null] });
    }
  });

  it.each([
    ['contiguous', {}], ['chunked', { chunks: [1000] }], ['packed', { chunks: [777], compression: 9 }], ['in one large chunk', { chunks: [300_000], compression: 1 }],
  ])('gives every bit of many values, %s', async (_, layout) => {
    const [x, u] = [doubles(300_000), doubles(300_000, (i) => Math.exp(i % 700) / 7)];
    const { columns } = await readTable(await writeHdf5([{ path: 'x', data: x, ...layout }, { path: 'u', data: u }]), ['u', 'x']);
    expect(Buffer.from(Float64Array.from(columns[0] ?? []).buffer).equals(Buffer.from(u.buffer))).toBe(true);
    expect(Buffer.from(Float64Array.from(columns[1] ?? []).buffer).equals(Buffer.from(x.buffer))).toBe(true);
  });

  it('takes integers, single precision, compounds and scalars', async () => {
    const bytes = await writeHdf5([
      { path: 'f', data: Float32Array.of(0.1, 2) }, { path: 'b', data: Uint8Array.of(255, 1) }, { path: 'h', data: Int16Array.of(-3, 4) }, { path: 'i', data: Int32Array.of(-5, 6) },
      { path: 'q', data: BigInt64Array.of(-7n, 8n), dtype: '<q' },
      { path: 'points', data: new Map<string, unknown>([['x', Float64Array.of(1.5, 2.5)], ['n', Int32Array.of(3, 4)], ['at', new Map([['y', Float32Array.of(5, 6)]])]]) },
    ]);
    expect((await readTable(bytes, ['f', 'b', 'h', 'i', 'q', 'points.x', 'n', 'y'])).columns).toEqual([
      [Math.fround(0.1), 2], [255, 1], [-3, 4], [-5, 6], [-7, 8], [1.5, 2.5], [3, 4], [5, 6],
    ]);
    expect((await readTable(await writeHdf5([{ path: 's', data: [4], shape: [], dtype: '<d' }]), ['s'])).columns).toEqual([[4]]);
  });

  it('gives vectors their components and flattens structured grids, however they are chunked', async () => {
    const shapes = fc.record({ dims: fc.array(fc.integer({ min: 1, max: 14 }), { minLength: 2, maxLength: 4 }), cut: fc.array(fc.double({ min: 0.1, max: 1, noNaN: true }), { minLength: 4, maxLength: 4 }) });
    await fc.assert(fc.asyncProperty(shapes, fc.boolean(), async ({ dims, cut }, isChunked) => {
      const values = doubles(dims.reduce((product, dim) => product * dim, 1), (i) => i);
      const chunks = dims.map((dim, at) => Math.max(1, Math.floor(dim * (cut[at] ?? 1))));
      const bytes = await writeHdf5([{ path: 'a', data: values, shape: dims, ...(isChunked && { chunks, compression: 1 }) }]);
      const last = dims.at(-1) ?? 1;
      const isVector = last === 2 || last === 3;
      const name = isVector ? `a[${last - 1}]` : 'a';
      expect((await readTable(bytes, [name])).columns).toEqual([[...values].filter((_, i) => !isVector || i % last === last - 1)]);
    }), { numRuns: 25 });
  });

  it('takes one-dimensional arrays for the axes of a grid where only one direction has their length', async () => {
    const [nx, ny] = [30, 700];
    const bytes = (chunk: number) => writeHdf5([
      { path: 'x', data: doubles(nx, (i) => i) }, { path: 'y', data: doubles(ny, (i) => i / 2) }, { path: 'T', data: doubles(nx * ny), shape: [nx, ny], ...(chunk > 0 && { chunks: [chunk, ny] }) },
    ]);
    for (const chunk of [0, 7]) {
      const { columns: [x = [], y = [], T = []] } = await readTable(await bytes(chunk), ['x', 'y', 'T']);
      expect(T).toEqual([...doubles(nx * ny)]);
      expect(x).toEqual(T.map((_, row) => Math.floor(row / ny)));
      expect(y).toEqual(T.map((_, row) => (row % ny) / 2));
    }
    const square = await writeHdf5([{ path: 'x', data: doubles(20) }, { path: 'T', data: doubles(400), shape: [20, 20] }]);
    expect(await readReasons(square, ['T', 'x'])).toMatchObject([{ code: 'column-length', found: '20 values (20)', expected: '400 values, as in T' }]);
  });

  it('is the same read one array after another, as where chunks are too large to be held side by side', async () => {
    const bytes = await writeHdf5([
      { path: 'x', data: doubles(3, (i) => i) }, { path: 'u', data: doubles(9000), shape: [3, 3000], chunks: [3, 3000] }, { path: 'v', data: Float32Array.from(doubles(9000)), shape: [3, 3000], chunks: [1, 100] },
    ]);
    const readWith = async (mostHeld?: number) => {
      const rows: number[][] = [];
      await readHdf5(Readable.from([bytes]) as AsyncIterable<Buffer>, {
        wanted: ['v', 'x', 'u'], reasons: createReasonCollector(), onPiece: () => undefined,
        onBatch: ({ rows: count, columns }) => { for (let row = 0; row < count; row += 1) rows.push(columns.map((column) => column[row] ?? NaN)); },
      }, mostHeld);
      return rows;
    };
    expect(await readWith(0)).toEqual(await readWith());
    expect((await readWith(0))[8999]).toEqual([Math.fround(Math.sin(8999)), 2, Math.sin(8999)]);
  });

  it('shows columns by path with first rows', async () => {
    const bytes = await writeHdf5([
      { path: 'p', data: doubles(60, (i) => i), shape: [30, 2] }, { path: 'grid/T', data: doubles(300, (i) => i / 2), shape: [3, 100] }, { path: 'name', data: ['a'] }, { path: 'w', data: Float64Array.of(7) },
    ]);
    const preview = await readPreview(byteSource(bytes));
    expect(preview).toMatchObject({ format: 'hdf5', compressed: false, header: ['grid/T', 'p[0]', 'p[1]', 'w'], firstRows: { length: 10 } });
    expect([preview.firstRows[0], preview.firstRows[9]]).toEqual([['0', '0', '1', '7'], ['4.5', '18', '19', '']]);
  });

  it('follows links in the file, each group once, and none that leads out of it', async () => {
    const bytes = await writeHdf5(xu, (file) => {
      file.create_soft_link('/fields/u', 'soft');
      file.create_soft_link('/nowhere', 'gone');
      file.create_hard_link('/mesh', 'fields/round');
      file.create_hard_link('/', 'mesh/up');
      file.create_external_link('/etc/hostname', '/u', 'away');
    });
    expect((await readPreview(byteSource(bytes))).header).toEqual(['fields/round/x', 'fields/u', 'soft']);
    expect(await readReasons(bytes, ['away'])).toMatchObject([{ code: 'column-missing' }]);
  });

  it.each([
    ['text', [{ path: 'u', data: ['a', 'b'] }], 'column-type', 'u: text'],
    ['columns of several lengths', [{ path: 'u', data: doubles(3) }, { path: 'x', data: doubles(2) }], 'column-length', '2 values (2)'],
    ['a grid beside a column', [{ path: 'u', data: doubles(40), shape: [4, 10] }, { path: 'x', data: doubles(5) }], 'column-length', '5 values (5)'],
    ['a name in two places', [{ path: 'a/u', data: doubles(3) }, { path: 'b/u', data: doubles(3) }], 'duplicate-column', 'a/u, b/u'],
    ['nothing of that name', [{ path: 'v', data: doubles(3) }], 'column-missing', 'v'],
    ['no values', [{ path: 'u', data: doubles(0), shape: [0] }], 'too-few-rows', 'no row of numbers'],
    ['no datasets', [], 'column-missing', 'no columns'],
  ])('with %s is rejected as that', async (_, datasets, code, found) => {
    const wanted = datasets.some(({ path }) => path === 'x') ? ['u', 'x'] : ['u'];
    expect(await readReasons(await writeHdf5(datasets), wanted)).toMatchObject([{ code, found }]);
  });

  it('cut off anywhere, or with anything overwritten, is rejected or read, and the next file is read', async () => {
    const bytes = await writeHdf5([{ path: 'g/x', data: doubles(2000), chunks: [500], compression: 4 }, { path: 'u', data: doubles(2000) }]);
    const damages = fc.oneof(
      fc.nat(bytes.length - 1).map((end) => bytes.subarray(0, Math.max(9, end))),
      fc.tuple(fc.nat(bytes.length - 5), fc.uint8Array({ minLength: 1, maxLength: 4 })).map(([at, others]) => {
        const copy = Buffer.from(bytes);
        copy.set(others, at);
        return copy;
      }),
    );
    await fc.assert(fc.asyncProperty(damages, async (content) => {
      await readReasons(content, ['x', 'u']);
    }), { numRuns: 30, seed: 20 });
    expect(await readReasons(bytes.subarray(0, 4000), ['x', 'u'])).toMatchObject([{ code: 'damaged-file', found: expect.stringContaining('truncated file') as string }]);
    expect(await readReasons(bytes, ['x', 'u'])).toEqual([]);
  });
});
