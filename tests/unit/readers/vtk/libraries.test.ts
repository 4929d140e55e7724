import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readTable } from '@/tests/support/read-table';

const read = (file: string, names: string[]) => readTable(readFileSync(`fixtures/vtk/${file}`), names);
const near = (values: readonly number[] = [], digits = 12) => values.map((value) => expect.closeTo(value, digits) as number);

const files: [file: string, cells: number, digits: number][] = [
  ['flat-ascii.vtu', 5, 12], ['solid-ascii.vtu', 6, 12], ['solid-binary.vtu', 6, 12], ['solid-appended.vtu', 6, 12], ['solid-raw.vtu', 6, 12],
  ['image.vti', 12, 12], ['straight.vtr', 6, 12], ['curved.vts', 6, 12],
];

describe.each(files)('%s', (file, cells, digits) => {
  it('has the sizes of cells that the library finds', async () => {
    const { columns: [volume, size, number, t] } = await read(file, ['volume', 'size', 'number', 't']);
    expect(volume).toEqual(near(size, digits));
    expect(number).toEqual(Array.from({ length: cells }, (_, at) => at + 1));
    expect(t).toEqual(Array<number>(cells).fill(0.375));
  });

  it('has values at their points', async () => {
    const { columns: [x = [], y = [], z = [], p = []] } = await read(file, ['x', 'y', 'z', 'p']);
    expect(p.length).toBeGreaterThan(cells);
    expect(p).toEqual(near(x.map((value, at) => 1 + value + 2 * (y[at] ?? NaN) + 3 * (z[at] ?? NaN))));
  });
});

describe('solid-ascii.vtu', () => {
  it('is the same in every encoding', async () => {
    const names = ['x', 'y', 'z', 'volume', 'cells/size'];
    const { columns } = await read('solid-ascii.vtu', names);
    for (const encoding of ['binary', 'appended', 'raw']) {
      const { columns: other } = await read(`solid-${encoding}.vtu`, names);
      expect(other).toEqual(columns.map((values) => near(values)));
    }
  });
});

describe('pieces.vtu', () => {
  it('is put together from its pieces, without what one has of the other', async () => {
    const { columns: [x, y, volume, number] } = await read('pieces.vtu', ['x', 'y', 'volume', 'number']);
    expect({ x, y }).toEqual({ x: near([0.5, 1.5, 2.5, 0.5, 1.5, 2.5]), y: near([0.5, 0.5, 0.5, 1.5, 1.5, 1.5]) });
    expect(volume).toEqual(near([1, 1, 1, 1, 1, 1]));
    expect(number).toEqual([1, 2, 3, 4, 5, 6]);
    const { columns: [px = [], py = [], p] } = await read('pieces.vtu', ['x', 'y', 'p']);
    expect(p).toEqual(near(px.map((value, at) => 1 + value + 2 * (py[at] ?? NaN))));
    expect(px).toHaveLength(12);
  });
});

describe('meshio.vtu', () => {
  it('has areas and centres of quads and triangles, and its points', async () => {
    const { columns: [x, y, volume, number] } = await read('meshio.vtu', ['x', 'y', 'volume', 'number']);
    expect(volume).toEqual(near([0.7, 1.05, 0.8, 0.6, 0.6]));
    expect(x).toEqual(near([0.5, 1.75, 0.5, 2, 1.5]));
    expect(y).toEqual(near([0.35, 0.35, 1.1, (0.7 + 0.7 + 1.5) / 3, (0.7 + 1.5 + 1.5) / 3]));
    expect(number).toEqual([1, 2, 3, 4, 5]);
    const { columns: [px = [], py = [], p] } = await read('meshio.vtu', ['x', 'y', 'p']);
    expect(p).toEqual(near(px.map((value, at) => 1 + value + 2 * (py[at] ?? NaN))));
  });
});
