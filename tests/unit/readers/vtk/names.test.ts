import { describe, expect, it } from 'vitest';
import { readPreview } from '@/lib/readers/read-preview';
import { byteSource } from '@/tests/support/byte-source';
import { readReasons, readTable } from '@/tests/support/read-table';
import { unstructuredPiece, writeVtk, type VtkArray, type VtkGrid, type VtkPiece } from '@/tests/support/vtk-writer';

const square = [[0, 0, 0], [3, 0, 0], [3, 3, 0], [0, 3, 0]];
const triangles = [[5, [0, 1, 2]], [5, [0, 2, 3]]] as const;
const ofCells = (name: string): VtkArray => ({ name, values: [10, 20] });
const ofPoints = (name: string): VtkArray => ({ name, values: [1, 2, 3, 4] });
const file = (data: { cells?: VtkArray[]; points?: VtkArray[] }, more: Partial<VtkGrid> = {}) => writeVtk({ kind: 'UnstructuredGrid', pieces: [unstructuredPiece(square, triangles, data)], ...more }, { encoding: 'ascii' });
const preview = (bytes: Buffer) => readPreview(byteSource(bytes));

describe('columns of VTK XML', () => {
  it('are coordinates, volume and time first, then arrays by path', async () => {
    const { header, firstRows, ...rest } = await preview(file({ cells: [ofCells('u')], points: [{ name: 'U', components: 2, values: [1, 2, 3, 4, 5, 6, 7, 8] }] }, { time: 0.5 }));
    expect(rest).toEqual({ format: 'vtk', compressed: false, delimiter: null, hasHeader: true });
    expect(header).toEqual(['x', 'y', 'z', 'volume', 't', 'points/U[0]', 'points/U[1]', 'cells/u']);
    expect(firstRows.map((row) => [...row.slice(2, 5), ...row.slice(-3)])).toEqual([['0', '4.5', '0.5', '', '', '10'], ['0', '4.5', '0.5', '', '', '20']]);
  });

  it('have no volume where values stand at points alone', async () => {
    const { header, firstRows } = await preview(file({ points: [ofPoints('u')] }));
    expect(header).toEqual(['x', 'y', 'z', 'points/u']);
    expect(firstRows).toEqual([['0', '0', '0', '1'], ['3', '0', '0', '2'], ['3', '3', '0', '3'], ['0', '3', '0', '4']]);
  });

  it('are shown without coordinates where a cell has no measure', async () => {
    const pieces = [unstructuredPiece(square, [[23, [0, 1, 2, 3]]], { cells: [{ name: 'u', values: [7] }], points: [ofPoints('p')] })];
    const { firstRows } = await preview(writeVtk({ kind: 'UnstructuredGrid', pieces }, { encoding: 'raw' }));
    expect(firstRows).toEqual([['', '', '', '', '', '7']]);
  });

  it('of a large file are shown from the first rows of its first piece', async () => {
    const many = Array.from({ length: 30_000 }, (_, at) => at);
    const piece = { attributes: { Extent: '0 29999 0 0 0 0' }, sections: { PointData: [{ name: 'u', values: many }] } };
    for (const encoding of ['ascii', 'inline', 'raw', 'base64'] as const) {
      const { header, firstRows } = await preview(writeVtk({ kind: 'ImageData', pieces: [piece, piece] }, { encoding, block: encoding === 'ascii' ? undefined : 4096 }));
      expect({ header, firstRows }).toEqual({ header: ['x', 'y', 'z', 'points/u'], firstRows: many.slice(0, 10).map((at) => [String(at), '0', '0', String(at)]) });
    }
  });

  it('answer to a bare name where it is one of points or cells', async () => {
    const both = file({ cells: [ofCells('u'), ofCells('p')], points: [ofPoints('p'), ofPoints('q')] });
    expect((await readTable(both, ['x', 'u'])).columns).toEqual([[2, 1], [10, 20]]);
    expect((await readTable(both, ['x', 'q'])).columns).toEqual([[0, 3, 3, 0], [1, 2, 3, 4]]);
    expect((await readTable(both, ['x', 'cells/p', 'u'])).columns).toEqual([[2, 1], [10, 20], [10, 20]]);
    expect((await readTable(both, ['x', 'points/p'])).columns).toEqual([[0, 3, 3, 0], [1, 2, 3, 4]]);
  });

  it('of both kinds are refused where a name is of both, or rows would be', async () => {
    const both = file({ cells: [ofCells('p'), ofCells('u')], points: [ofPoints('p'), ofPoints('q')] });
    expect(await readReasons(both, ['x', 'p'])).toMatchObject([{ code: 'duplicate-column', expected: 'one column p' }]);
    expect(await readReasons(both, ['x', 'q', 'u'])).toMatchObject([{ code: 'mixed-rows', found: 'cells/u of cells beside points/q' }]);
    expect(await readReasons(both, ['x', 'volume', 'q'])).toMatchObject([{ code: 'mixed-rows', found: 'volume of cells beside points/q' }]);
    expect(await readReasons(both, ['x', 'speed'])).toMatchObject([{ code: 'column-missing', expected: 'speed' }]);
  });

  it('keep coordinates apart from arrays of such names', async () => {
    const { columns } = await readTable(file({ cells: [ofCells('x'), ofCells('volume')] }), ['x', 'volume', 'cells/x', 'cells/volume']);
    expect(columns).toEqual([[2, 1], [4.5, 4.5], [10, 20], [10, 20]]);
  });

  it('are found whatever the order of sections', async () => {
    const piece = unstructuredPiece(square, triangles, { cells: [ofCells('u')], points: [ofPoints('q')] });
    const { Cells, Points, CellData, PointData } = piece.sections;
    const bytes = writeVtk({ kind: 'UnstructuredGrid', pieces: [{ ...piece, sections: { Cells, Points, CellData, PointData } }] }, { encoding: 'ascii' });
    expect((await readTable(bytes, ['x', 'volume', 'u'])).columns).toEqual([[2, 1], [4.5, 4.5], [10, 20]]);
    expect((await readTable(bytes, ['x', 'q'])).columns).toEqual([[0, 3, 3, 0], [1, 2, 3, 4]]);
  });
});

describe('rows of several pieces', () => {
  const piece = (values: number[], ghosts: number[], name = 'vtkGhostType') => unstructuredPiece(square, triangles, { cells: [{ name: 'u', values }, { name, type: 'UInt8', values: ghosts }] });

  it('leave out cells that are marked as duplicates, refined or hidden', async () => {
    for (const form of [{ encoding: 'ascii' }, { encoding: 'raw', shuffled: true }] as const) {
      const bytes = writeVtk({ kind: 'UnstructuredGrid', pieces: [piece([1, 2], [0, 1]), piece([3, 4], [32, 0]), piece([5, 6], [8, 0])] }, form);
      expect((await readTable(bytes, ['u'])).columns).toEqual([[1, 4, 6]]);
    }
    expect((await readTable(writeVtk({ kind: 'UnstructuredGrid', pieces: [piece([1, 2], [0, 2], 'vtkGhostLevels')] }, { encoding: 'ascii' }), ['u'])).columns).toEqual([[1]]);
  });

  it('are refused where a mark means something else', async () => {
    const bytes = writeVtk({ kind: 'UnstructuredGrid', pieces: [piece([1, 2], [0, 2])] }, { encoding: 'ascii' });
    expect(await readReasons(bytes, ['u'])).toMatchObject([{ code: 'unsupported-format', found: 'VTK XML with vtkGhostType 2, row 2' }]);
  });

  it('are refused where a piece lacks an array or has it otherwise', async () => {
    const whole = unstructuredPiece(square, triangles, { cells: [ofCells('u')] });
    const lacking = unstructuredPiece(square, triangles, { cells: [ofCells('v')] });
    const vectors = (components: number) => unstructuredPiece(square, triangles, { cells: [{ name: 'u', components, values: Array.from({ length: 2 * components }, (_, at) => at) }] });
    const reasons = (pieces: VtkPiece[], name = 'u') => readReasons(writeVtk({ kind: 'UnstructuredGrid', pieces }, { encoding: 'raw' }), ['x', name]);
    expect(await reasons([whole, lacking])).toMatchObject([{ code: 'malformed-vtk', found: 'no “u” of cells, piece 2' }]);
    expect(await reasons([vectors(3), vectors(2)], 'u[1]')).toMatchObject([{ code: 'malformed-vtk', found: '2 components in “u” of cells, piece 2', expected: '3, as in the first piece' }]);
  });

  it('may be of pieces without anything', async () => {
    const empty = () => unstructuredPiece([], [], { cells: [{ name: 'u', values: [] }] });
    for (const encoding of ['ascii', 'inline', 'raw'] as const) {
      const bytes = writeVtk({ kind: 'UnstructuredGrid', pieces: [empty(), piece([1, 2], [0, 0]), empty()] }, { encoding });
      expect((await readTable(bytes, ['x', 'u'])).columns).toEqual([[2, 1], [1, 2]]);
    }
  });
});
