import fc from 'fast-check';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readPreview } from '@/lib/readers/read-preview';
import { byteSource } from '@/tests/support/byte-source';
import { writeHdf5Json } from '@/tests/support/hdf5-json';
import { readReasons, readTable } from '@/tests/support/read-table';

const single = { class: 'H5T_FLOAT', base: 'H5T_IEEE_F32BE' };
const integer = { class: 'H5T_INTEGER', base: 'H5T_STD_I32LE' };
const text = { class: 'H5T_STRING', length: 4 };
const simple = [{ path: 'mesh/x', value: [0, 1, 2] }, { path: 'fields/u', value: [1.5, -2e-3, 0] }];

describe('HDF5/JSON', () => {
  it.each([
    ['links first', writeHdf5Json(simple)],
    ['links after the datasets', writeHdf5Json(simple, { linksLast: true })],
    ['no links, by aliases', writeHdf5Json(simple, { noLinks: true })],
    ['soft links', writeHdf5Json([{ path: 'a/b', value: [0, 1, 2] }, { path: 'c', value: [1.5, -2e-3, 0] }], { soft: { x: '/a/b', u: 'c', gone: '/nowhere' } })],
  ])('is read by path, with %s', async (_, content) => {
    expect((await readTable(content, ['x', 'u'])).columns).toEqual([[0, 1, 2], [1.5, -2e-3, 0]]);
  });

  it('gives vectors, tensors and structured grids their columns', async () => {
    const content = writeHdf5Json([
      { path: 'p', dims: [2, 3], value: [[1, 2, 3], [4, 5, 6]] },
      { path: 's', dims: [2, 4], value: [[1, 2, 3, 4], [5, 6, 7, 8]] },
      { path: 'g', dims: [2, 10], value: [0, 10].map((from) => Array.from({ length: 10 }, (_, i) => from + i)) },
      { path: 'one', dims: [2, 1], value: [[8], [9]] },
    ]);
    expect((await readPreview(byteSource(content))).header).toEqual(['p[0]', 'p[1]', 'p[2]', 's', 's[0]', 's[1]', 's[2]', 's[3]', 'g', 'one']);
    expect((await readTable(content, ['p[0]', 'p[2]', 's[3]', 'one'])).columns).toEqual([[1, 4], [3, 6], [4, 8], [8, 9]]);
    expect((await readTable(content, ['s'])).columns).toEqual([[1, 2, 3, 4, 5, 6, 7, 8]]);
    expect((await readTable(content, ['g'])).columns).toEqual([Array.from({ length: 20 }, (_, i) => i)]);
  });

  it('takes one-dimensional arrays for the axes of a grid where only one direction has their length', async () => {
    const T = Array.from({ length: 2 }, (_, i) => Array.from({ length: 10 }, (_each, j) => i * 10 + j));
    const content = writeHdf5Json([{ path: 'x', value: [5, 6] }, { path: 'y', value: T[0] }, { path: 'T', dims: [2, 10], value: T }]);
    expect((await readTable(content, ['x', 'y', 'T'])).columns).toEqual([
      T.flat().map((_, row) => (row < 10 ? 5 : 6)), T.flat().map((_, row) => row % 10), T.flat(),
    ]);
  });

  it('takes compounds, arrays in them, integers, single precision and types kept apart', async () => {
    const type = { class: 'H5T_COMPOUND', fields: [
      { name: 'x', type: 'H5T_IEEE_F64LE' }, { name: 'name', type: text }, { name: 'U', type: { class: 'H5T_ARRAY', dims: [2], base: single } }, { name: 'n', type: integer },
    ] };
    const content = writeHdf5Json([{ path: 'points', type, value: [[0.5, 'a', [1, 2], 7], [1.5, 'b', [3, 4], 8]], dims: [2] }]);
    expect((await readTable(content, ['points.x', 'points.U[1]', 'n'])).columns).toEqual([[0.5, 1.5], [2, 4], [7, 8]]);
    const committed = JSON.stringify({ ...JSON.parse(writeHdf5Json([{ path: 'u', type: 'datatypes/t1', value: [1, 2] }])) as object, datatypes: { t1: { type: integer } } });
    expect((await readTable(committed, ['u'])).columns).toEqual([[1, 2]]);
  });

  it('is the same wherever the bytes are cut', async () => {
    const values = Array.from({ length: 3000 }, (_, i) => [Math.sin(i), i / 3]);
    const bytes = Buffer.from(writeHdf5Json([{ path: 'a/p', dims: [3000, 2], value: values }], { linksLast: true }));
    await fc.assert(fc.asyncProperty(fc.array(fc.nat(bytes.length - 1), { maxLength: 20 }), async (cuts) => {
      expect((await readTable(bytes, ['a/p[1]', 'a/p[0]'], cuts)).columns).toEqual([values.map(([, second]) => second), values.map(([first]) => first)]);
    }), { numRuns: 8 });
  });

  it('survives groups that hold each other and links that lead nowhere', async () => {
    const document = JSON.parse(writeHdf5Json(simple)) as { root: string; groups: Record<string, { links: unknown[] }> };
    for (const group of Object.values(document.groups)) {
      group.links.push({ class: 'H5L_TYPE_HARD', title: 'up', collection: 'groups', id: document.root }, { class: 'H5L_TYPE_EXTERNAL', title: 'away', file: 'b.h5', h5path: '/u' },
        { class: 'H5L_TYPE_HARD', title: 'ghost', collection: 'datasets', id: 'none' }, 7, null);
    }
    expect((await readPreview(byteSource(JSON.stringify(document)))).header).toEqual(['mesh/x', 'fields/u']);
  });

  it('shows columns by path with their first rows', async () => {
    const preview = await readPreview(byteSource(readFileSync('fixtures/solver-output/G1_formats/alt_grid_1.h5.json')));
    expect(preview).toMatchObject({ format: 'json', header: ['w', 'coordinates/x', 'coordinates/y', 'fields/u'], firstRows: { length: 10 } });
    expect(preview.firstRows[1]).toEqual([expect.stringMatching(/^0\.0/), '0.16666666666666666', '0.0', '4.882880876562343e-31']);
  });

  it('lists what is not a number by line, column and row', async () => {
    const content = writeHdf5Json([{ path: 'p', dims: [3, 2], value: [[0, 1], [2, null], ['3', { a: 1 }]] }]).replace('[2,null]', '\n[NaN,null]');
    expect(await readReasons(content, ['p[0]', 'p[1]'])).toEqual([
      { code: 'not-finite', count: 1, line: 2, column: 1, found: 'NaN in row 2', expected: 'a finite number' },
      { code: 'missing-value', count: 1, line: 2, column: 2, found: 'null in row 2', expected: 'a number' },
      { code: 'not-a-number', count: 1, line: 2, column: 1, found: '"3" in row 3', expected: 'a number without quotes' },
      { code: 'not-a-number', count: 1, line: 2, column: 2, found: 'an object in row 3', expected: 'a number' },
    ]);
  });

  it.each([
    ['fewer values than its shape', [{ path: 'u', dims: [3], value: [1, 2] }], 'column-length', '2 values'],
    ['more values than its shape', [{ path: 'u', dims: [1], value: [1, 2] }], 'column-length', '2 values'],
    ['lists unlike its shape', [{ path: 'u', dims: [2, 10], value: Array.from({ length: 10 }, () => [1, 2]) }], 'column-length', 'lists of 10 × 2'],
    ['lists of several lengths', [{ path: 'u[0]', dims: [2, 2], value: [[1, 2, 3], [4]] }], 'column-missing', 'u[0][0], u[0][1]'],
    ['an absurd shape', [{ path: 'u', dims: [1e15], value: [1, 2] }], 'column-length', '2 values'],
    ['a negative shape', [{ path: 'u', dims: [-2], value: [1, 2] }], 'column-length', '2 values'],
    ['a shape that is none', [{ path: 'u', shape: 'big', value: [1, 2] }], 'column-length', '2 values'],
    ['text', [{ path: 'u', type: text, value: ['a', 'b'] }], 'column-type', 'u: text'],
    ['no type', [{ path: 'u', type: null, value: [1, 2] }], 'column-type', 'u: values without a type'],
    ['references', [{ path: 'u', type: { class: 'H5T_REFERENCE' }, value: ['a'] }], 'column-type', 'u: references'],
    ['columns of several lengths', [{ path: 'u', value: [1, 2] }, { path: 'x', value: [1] }], 'column-length', '1 values (1)'],
    ['a name in two places', [{ path: 'a/u', value: [1] }, { path: 'b/u', value: [1] }], 'duplicate-column', 'a/u, b/u'],
    ['nothing of that name', [{ path: 'v', value: [1] }], 'column-missing', 'v'],
  ])('with %s is rejected as that', async (_, datasets, code, found) => {
    const wanted = datasets.some(({ path }) => path === 'x') ? ['u', 'x'] : ['u'];
    expect(await readReasons(writeHdf5Json(datasets), wanted)).toMatchObject([{ code, found }]);
  });

  it('cut off anywhere is rejected', async () => {
    const content = writeHdf5Json(simple);
    for (let end = 1; end < content.length; end += 7) {
      expect((await readReasons(content.slice(0, end), ['x', 'u'])).map(({ code }) => code), content.slice(0, end)).toEqual(['malformed-json']);
    }
  });

  it('of more description than any file has is rejected', async () => {
    const content = `{"groups":{"a":{"links":[${'0,'.repeat(4_000_001)}0]}}}`;
    expect((await readReasons(content, ['u'])).map(({ code }) => code)).toEqual(['malformed-json']);
  });
});
