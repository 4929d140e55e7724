import fc from 'fast-check';
import { gzipSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { readTable } from '@/tests/support/read-table';
import { readVtkPieces } from '@/tests/support/read-vtk-pieces';
import { unstructuredPiece, vtkTypes, writeVtk, type VtkForm, type VtkGrid } from '@/tests/support/vtk-writer';

/** A square of two triangles and a quad beside it. */
const points = [[0, 0, 0], [2, 0, 0], [2, 2, 0], [0, 2, 0], [3, 0, 0], [3, 2, 0]];
const cells = [[5, [0, 1, 2]], [5, [0, 2, 3]], [9, [1, 4, 5, 2]]] as const;
const grid: VtkGrid = {
  kind: 'UnstructuredGrid', time: 0.25,
  pieces: [unstructuredPiece(points, cells, {
    cells: [{ name: 'u', values: [1.5, -2e-3, 1 / 3] }, { name: 'U', components: 3, values: [1, 2, 3, 4, 5, 6, 7, 8, 9] }],
    points: [{ name: 'p', type: 'Float32', values: [0, 0.5, 1, 1.5, 2, 2.5] }],
  })],
};
const forms: VtkForm[] = (['ascii', 'inline', 'base64', 'raw'] as const).flatMap((encoding): VtkForm[] => (encoding === 'ascii' ? [{ encoding }] : [
  ...[undefined, 16, 40, 4096].flatMap((block) => (['UInt32', 'UInt64'] as const).flatMap((header) => [false, true].map((bigEndian) => ({ encoding, block, header, bigEndian })))),
  ...(encoding === 'inline' ? [] : [{ encoding, shuffled: true }, { encoding, shuffled: true, block: 16 }]),
]));
const cellColumns = [[4 / 3, 2 / 3, 2.5], [2 / 3, 4 / 3, 1], [0, 0, 0], [2, 2, 2], [0.25, 0.25, 0.25], [1.5, -2e-3, 1 / 3], [2, 5, 8]];
const close = (columns: readonly number[][]) => columns.map((column) => column.map((value) => expect.closeTo(value, 14) as number));

describe('a grid of VTK XML', () => {
  it.each(forms.map((form) => [JSON.stringify(form), form] as const))('is the same as %s', async (_, form) => {
    const bytes = writeVtk(grid, form);
    expect((await readTable(bytes, ['x', 'y', 'z', 'volume', 't', 'u', 'U[1]'])).columns).toEqual(close(cellColumns));
    expect((await readTable(bytes, ['x', 'y', 'points/p'])).columns).toEqual([[0, 2, 2, 0, 3, 3], [0, 0, 2, 2, 0, 2], [0, 0.5, 1, 1.5, 2, 2.5]]);
  });

  it('is the same wherever the bytes are cut, also packed with gzip', async () => {
    await fc.assert(fc.asyncProperty(fc.constantFrom(...forms), fc.boolean(), fc.array(fc.nat(5000), { maxLength: 30 }), async (form, isPacked, cuts) => {
      const bytes = writeVtk(grid, form);
      const names = ['x', 'y', 'z', 'volume', 't', 'u', 'U[1]'];
      const columns = isPacked ? (await readTable(gzipSync(bytes), names)).columns : await readVtkPieces(bytes, names, cuts.map((cut) => cut % bytes.length));
      expect(columns).toEqual(close(cellColumns));
    }), { numRuns: 150 });
  });

  it('is the same byte by byte', async () => {
    for (const form of [{ encoding: 'ascii' }, { encoding: 'inline', block: 16 }, { encoding: 'raw', block: 16 }, { encoding: 'base64' }] as const) {
      const bytes = writeVtk(grid, form);
      const columns = await readVtkPieces(bytes, ['x', 'y', 'z', 'volume', 't', 'u', 'U[1]'], Array.from({ length: bytes.length }, (_, at) => at));
      expect(columns).toEqual(close(cellColumns));
    }
  });

  it.each(vtkTypes)('has numbers of %s', async (type) => {
    const extremes = { Int8: [-128, 127, 0], UInt8: [0, 255, 1], Int16: [-32768, 32767, 0], UInt16: [0, 65535, 1], Int32: [-(2 ** 31), 2 ** 31 - 1, 0], UInt32: [0, 2 ** 32 - 1, 1] };
    const values = type in extremes ? extremes[type as 'Int8'] : type === 'UInt64' ? [0, 2 ** 53, 2 ** 63 - 1024] : type === 'Int64' ? [-(2 ** 62), 2 ** 53, -1] : [0.5, -1.25e8, 2 ** -100];
    for (const form of [{ encoding: 'raw' }, { encoding: 'raw', bigEndian: true }, { encoding: 'inline' }, { encoding: 'ascii' }] as const) {
      const typed = { ...grid, pieces: [unstructuredPiece(points, cells, { cells: [{ name: 'q', type, values }] })] };
      expect((await readTable(writeVtk(typed, form), ['q'])).columns).toEqual([values]);
    }
  });

  it('has blocks of any size, in pieces of any size', async () => {
    const many = Array.from({ length: 400_000 }, (_, at) => Math.sin(at) * 10 ** (at % 9));
    const large: VtkGrid = { kind: 'ImageData', pieces: [{ attributes: { Extent: '0 399999 0 0 0 0' }, sections: { PointData: [{ name: 'q', values: many }] } }] };
    for (const block of [32_768, 5_000_000]) {
      for (const encoding of ['raw', 'inline'] as const) {
        const bytes = writeVtk(large, { encoding, block });
        const { columns } = await readTable(bytes, ['q'], Array.from({ length: 40 }, (_, at) => at * 70_001));
        expect(columns[0]?.every((value, at) => value === many[at])).toBe(true);
        expect(columns[0]).toHaveLength(400_000);
      }
    }
  });

  it('tells digits where they are printed, and none of bytes', async () => {
    expect((await readTable(writeVtk(grid, { encoding: 'ascii' }), ['x', 'U[0]', 'u'])).digits).toEqual([null, 1, 16]);
    expect((await readTable(writeVtk(grid, { encoding: 'raw' }), ['x', 'U[0]', 'u'])).digits).toEqual([null, null, null]);
  });
});
