import { describe, expect, it } from 'vitest';
import { readPreview } from '@/lib/readers/read-preview';
import { byteSource } from '@/tests/support/byte-source';
import { readReasons, readTable } from '@/tests/support/read-table';
import { writeVtk, type VtkGrid } from '@/tests/support/vtk-writer';

const near = (values: readonly number[]) => values.map((value) => expect.closeTo(value, 14) as number);
const axes = (...lists: number[][]) => lists.map((values, at) => ({ name: `axis ${at}`, values }));
const count = (cells: number) => ({ name: 'u', values: Array.from({ length: cells }, (_, at) => at) });

const boxes: VtkGrid = {
  kind: 'RectilinearGrid',
  pieces: [{ attributes: { Extent: '0 2 0 1 0 1' }, sections: { CellData: [count(2)], PointData: [{ ...count(12), name: 'p' }], Coordinates: axes([0, 1, 3], [0, 0.5], [1, 5]) } }],
};

describe('a rectilinear grid', () => {
  it('has cells of the product of its spacings, with their sizes', async () => {
    const { columns } = await readTable(writeVtk(boxes, { encoding: 'raw' }), ['x', 'y', 'z', 'volume', 'dx', 'dy', 'dz', 'u']);
    expect(columns).toEqual([[0.5, 2], [0.25, 0.25], [3, 3], [2, 4], [1, 2], [0.5, 0.5], [4, 4], [0, 1]].map(near));
    expect((await readPreview(byteSource(writeVtk(boxes, { encoding: 'ascii' })))).header).toEqual(['x', 'y', 'z', 'volume', 'dx', 'dy', 'dz', 'cells/u', 'points/p']);
  });

  it('has points with x running first', async () => {
    const { columns } = await readTable(writeVtk(boxes, { encoding: 'ascii' }), ['x', 'y', 'z', 'p']);
    expect(columns[0]).toEqual([0, 1, 3, 0, 1, 3, 0, 1, 3, 0, 1, 3]);
    expect(columns[1]).toEqual([0, 0, 0, 0.5, 0.5, 0.5, 0, 0, 0, 0.5, 0.5, 0.5]);
    expect(columns[2]).toEqual([1, 1, 1, 1, 1, 1, 5, 5, 5, 5, 5, 5]);
  });

  it('of one layer of points has areas', async () => {
    const flat: VtkGrid = { kind: 'RectilinearGrid', pieces: [{ attributes: { Extent: '3 5 0 1 7 7' }, sections: { CellData: [count(2)], Coordinates: axes([0, 1, 3], [0, 0.5], [9]) } }] };
    const { columns } = await readTable(writeVtk(flat, { encoding: 'inline' }), ['x', 'z', 'volume', 'dz']);
    expect(columns).toEqual([[0.5, 2], [9, 9], [0.5, 1], [0, 0]].map(near));
  });

  it('is refused where coordinates do not rise, or are not as many as points', async () => {
    const withX = (values: number[]): VtkGrid => ({ ...boxes, pieces: boxes.pieces.map((piece) => ({ ...piece, sections: { ...piece.sections, Coordinates: axes(values, [0, 0.5], [1, 5]) } })) });
    expect(await readReasons(writeVtk(withX([0, 1, 1]), { encoding: 'ascii' }), ['x', 'u'])).toMatchObject([{ code: 'malformed-vtk', found: '1 after 1 along x', expected: 'coordinates that rise' }]);
    expect(await readReasons(writeVtk(withX([0, 1]), { encoding: 'ascii' }), ['x', 'u'])).toMatchObject([{ code: 'malformed-vtk', found: '2 values in Coordinates x', expected: '3' }]);
  });
});

describe('an image', () => {
  const image: VtkGrid = {
    kind: 'ImageData', attributes: { Origin: '1 2 3', Spacing: '0.5 2 1' },
    pieces: [{ attributes: { Extent: '2 4 0 1 0 0' }, sections: { CellData: [count(2)], PointData: [{ ...count(6), name: 'p' }] } }],
  };

  it('has cells and points by origin, spacing and extent', async () => {
    const bytes = writeVtk(image, { encoding: 'base64' });
    expect((await readTable(bytes, ['x', 'y', 'z', 'volume', 'dx'])).columns).toEqual([[2.25, 2.75], [3, 3], [3, 3], [1, 1], [0.5, 0.5]].map(near));
    expect((await readTable(bytes, ['x', 'y', 'p'])).columns).toEqual([[2, 2.5, 3, 2, 2.5, 3], [2, 2, 2, 4, 4, 4], [0, 1, 2, 3, 4, 5]].map(near));
  });

  it('that is turned is refused', async () => {
    const turned = { ...image, attributes: { ...image.attributes, Direction: '0 1 0 1 0 0 0 0 1' } };
    expect(await readReasons(writeVtk(turned, { encoding: 'ascii' }), ['x'])).toMatchObject([{ code: 'malformed-vtk', line: 3, found: 'Direction “0 1 0 1 0 0 0 0 1”' }]);
  });
});

describe('a structured grid', () => {
  const points = (place: (i: number, j: number, k: number) => number[]) => [0, 1].flatMap((k) => [0, 1, 2].flatMap((j) => [0, 1].map((i) => place(i, j, k)))).flat();
  const grid = (place: (i: number, j: number, k: number) => number[]): Buffer => writeVtk({
    kind: 'StructuredGrid',
    pieces: [{ attributes: { Extent: '0 1 0 2 0 1' }, sections: { CellData: [count(2)], Points: [{ name: 'Points', components: 3, values: points(place) }] } }],
  }, { encoding: 'raw', block: 64 });

  it('has volumes whichever way its directions turn', async () => {
    for (const turn of [1, -1]) {
      const { columns } = await readTable(grid((i, j, k) => [2 * i + j, j, turn * k]), ['x', 'y', 'z', 'volume']);
      expect(columns).toEqual([[1.5, 2.5], [0.5, 1.5], [0.5 * turn, 0.5 * turn], [2, 2]].map(near));
    }
  });

  it('of a line has lengths', async () => {
    const line = writeVtk({
      kind: 'StructuredGrid', pieces: [{ attributes: { Extent: '0 0 0 2 0 0' }, sections: { CellData: [count(2)], Points: [{ name: 'Points', components: 3, values: [0, 0, 0, 3, 4, 0, 3, 4, 2] }] } }],
    }, { encoding: 'ascii' });
    expect((await readTable(line, ['x', 'z', 'volume'])).columns).toEqual([[1.5, 3], [0, 1], [5, 2]].map(near));
  });
});
