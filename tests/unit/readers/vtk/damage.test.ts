import fc from 'fast-check';
import { readFileSync } from 'node:fs';
import { deflateSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { readPreview } from '@/lib/readers/read-preview';
import { RejectedFile } from '@/lib/readers/rejected-file';
import { byteSource } from '@/tests/support/byte-source';
import { readReasons, readTable } from '@/tests/support/read-table';
import { unstructuredPiece, writeVtk, type VtkArray, type VtkForm, type VtkPiece } from '@/tests/support/vtk-writer';

const square = [[0, 0, 0], [3, 0, 0], [3, 3, 0], [0, 3, 0]];
const triangles = [[5, [0, 1, 2]], [5, [0, 2, 3]]] as const;
const whole = () => unstructuredPiece(square, triangles, { cells: [{ name: 'u', values: [10, 20] }], points: [{ name: 'p', values: [1, 2, 3, 4] }] });
const write = (piece: VtkPiece = whole(), form: VtkForm = { encoding: 'ascii' }) => writeVtk({ kind: 'UnstructuredGrid', pieces: [piece] }, form);
const edited = (from: string | RegExp, to: string, bytes = write()) => {
  const text = bytes.toString('latin1');
  const changed = text.replace(from, to);
  if (changed === text) throw new Error(`nothing matches ${from}`);
  return Buffer.from(changed, 'latin1');
};
/** One array of a section replaced. */
function withArray(section: 'Cells' | 'Points' | 'CellData', name: string, change: (array: VtkArray) => Partial<VtkArray>): VtkPiece {
  const piece = whole();
  return { ...piece, sections: { ...piece.sections, [section]: piece.sections[section]?.map((array) => (array.name === name ? { ...array, ...change(array) } : array)) } };
}
const withPolyhedron = (faces: number[], offset: number): VtkPiece => {
  const piece = unstructuredPiece([[0, 0, 0], [1, 0, 0], [0, 1, 0], [0, 0, 1]], [[42, [0, 1, 2, 3]]], { cells: [{ name: 'u', values: [1] }] });
  return { ...piece, sections: { ...piece.sections, Cells: [...piece.sections.Cells ?? [], { name: 'faces', type: 'Int64', values: faces }, { name: 'faceoffsets', type: 'Int64', values: [offset] }] } };
};
const faces = [4, 3, 0, 1, 2, 3, 0, 1, 3, 3, 1, 2, 3, 3, 0, 2, 3];

type Case = [what: string, bytes: Buffer, reason: { code: string; line?: number | null; found?: string; expected?: string }];
const tags: Case[] = [
  ['a document type', edited('<VTKFile', '<!DOCTYPE x [<!ENTITY a "b">]>\n<VTKFile'), { code: 'unsupported-format', found: 'XML or HTML' }],
  ['a document type behind the first tag', edited('<UnstructuredGrid>', '<!DOCTYPE x>\n<UnstructuredGrid>'), { code: 'malformed-vtk', line: 3, found: '<!DOCTYPE x>' }],
  ['an entity of its own', edited('Name="u"', 'Name="&u;"'), { code: 'malformed-vtk', line: 12, found: 'undefined entity.' }],
  ['a tag that is not closed', edited('</CellData>', ''), { code: 'malformed-vtk' }],
  ['a tag without end', Buffer.from(`<VTKFile type="ImageData"><${'x'.repeat(140_000)}`), { code: 'malformed-vtk', found: 'a tag of more than 64 KiB' }],
  ['tags a thousand deep', edited('</CellData>', '<a>'.repeat(2000)), { code: 'malformed-vtk', found: 'more than 64 tags inside each other' }],
  ['another kind', edited('type="UnstructuredGrid"', 'type="PolyData"'), { code: 'unsupported-format', found: 'VTK XML of PolyData' }],
  ['names of other files', edited('type="UnstructuredGrid"', 'type="PUnstructuredGrid"'), { code: 'unsupported-format', found: 'VTK XML of the names of other files' }],
  ['another byte order', edited('LittleEndian', 'MixedEndian'), { code: 'unsupported-format', found: 'VTK XML with byte_order MixedEndian' }],
  ['another length of lengths', edited('UInt32', 'UInt16'), { code: 'unsupported-format', found: 'VTK XML with header_type UInt16' }],
  ['another packing', edited('header_type', 'compressor="vtkLZ4DataCompressor" header_type'), { code: 'unsupported-format', found: 'VTK XML packed by vtkLZ4DataCompressor' }],
  ['another format of an array', edited('format="ascii"', 'format="hex"'), { code: 'unsupported-format', found: 'VTK XML with numbers as hex' }],
  ['another encoding of appended data', edited('encoding="raw"', 'encoding="hex"', write(whole(), { encoding: 'raw' })), { code: 'unsupported-format', found: 'VTK XML with appended data as hex' }],
  ['points of a type that is none', edited('"Float64" Name="Points"', '"Float16" Name="Points"'), { code: 'unsupported-format', found: 'VTK XML with Points of type Float16' }],
  ['two coordinates', edited('NumberOfComponents="3"', 'NumberOfComponents="2"'), { code: 'malformed-vtk', line: 18, found: '2 coordinates for each point' }],
  ['no number of points', edited(' NumberOfPoints="4"', ''), { code: 'malformed-vtk', line: 4, found: 'no NumberOfPoints' }],
  ['a number of cells that is none', edited('NumberOfCells="2"', 'NumberOfCells="-2"'), { code: 'malformed-vtk', line: 4, found: 'NumberOfCells “-2”' }],
  ['an array twice', write(unstructuredPiece(square, triangles, { cells: [{ name: 'u', values: [1, 2] }, { name: 'u', values: [1, 2] }] })), { code: 'malformed-vtk', found: 'another array “u” in CellData' }],
  ['the end in the middle', write().subarray(0, 700), { code: 'malformed-vtk' }],
  ['more cells than arrays hold', edited('NumberOfCells="2"', 'NumberOfCells="3"'), { code: 'malformed-vtk', line: 12, found: '2 values in “u” of cells', expected: '3' }],
  ['fewer points than arrays hold', edited('NumberOfPoints="4"', 'NumberOfPoints="3"'), { code: 'malformed-vtk', line: 18, found: 'more than 9 values in Points', expected: '9' }],
  ['more points than can be', edited('NumberOfPoints="4"', 'NumberOfPoints="400000000000000"'), { code: 'malformed-vtk', found: '12 values in Points' }],
  ['no Cells', edited(/<Cells>[^]*<\/Cells>/, ''), { code: 'malformed-vtk', found: 'no “connectivity” of Cells' }],
  ['no Points', edited(/<Points>[^]*<\/Points>/, ''), { code: 'malformed-vtk', found: 'no Points' }],
];
const numbers: Case[] = [
  ['text in a field', edited('10 20', '10 two'), { code: 'not-a-number', line: 14, found: 'two' }],
  ['text in Points', edited('0 0 0 3', '0 0 zero 3'), { code: 'not-a-number', line: 20, found: 'zero in Points' }],
  ['a word without end', edited('10 20', `10 ${'9'.repeat(1000)}`), { code: 'malformed-vtk', found: 'a word of more than 200 characters in “u” of cells' }],
  ['NaN in a field', edited('10 20', '10 NaN'), { code: 'not-finite', line: null, found: 'NaN in row 2' }],
  ['an infinity in bytes', write(withArray('CellData', 'u', () => ({ values: [1, Infinity] })), { encoding: 'raw' }), { code: 'not-finite', found: 'Infinity in row 2' }],
  ['NaN in coordinates', write(withArray('Points', 'Points', ({ values }) => ({ values: values.map((value, at) => (at === 0 ? NaN : value)) })), { encoding: 'raw' }), { code: 'not-finite', found: 'NaN in row 1, x' }],
];
const geometry: Case[] = [
  ['a point that is not there', write(withArray('Cells', 'connectivity', () => ({ values: [0, 1, 4, 0, 2, 3] }))), { code: 'malformed-vtk', found: 'point 4, cell 1', expected: 'points from 0 to 3' }],
  ['a point before the first', write(withArray('Cells', 'connectivity', () => ({ values: [0, 1, 2, 0, -1, 3] }))), { code: 'malformed-vtk', found: 'point -1, cell 2' }],
  ['a point between two', edited('0 1 2 0 2 3', '0 1 2 0 2.5 3'), { code: 'malformed-vtk', found: 'point 2.5, cell 2' }],
  ['offsets that fall', write(withArray('Cells', 'offsets', () => ({ values: [3, 2] }))), { code: 'malformed-vtk', found: 'offset 2 after 3, cell 2' }],
  ['offsets beyond', write(withArray('Cells', 'offsets', () => ({ values: [3, 7] }))), { code: 'malformed-vtk', found: 'offset 7 after 3, cell 2', expected: 'offsets that rise to 6' }],
  ['an offset of NaN', edited('\n3 6\n', '\nnan 6\n'), { code: 'malformed-vtk', found: 'offset NaN after 0, cell 1' }],
  ['another number of corners', write(withArray('Cells', 'types', () => ({ values: [5, 9] }))), { code: 'malformed-vtk', found: '3 points of a quad, cell 2', expected: '4' }],
  ['a quadratic cell', write(withArray('Cells', 'types', () => ({ values: [5, 22] }))), { code: 'unsupported-cell', found: 'quadratic triangle, cell 2', expected: 'cells with straight edges' }],
  ['a cell of no kind', write(withArray('Cells', 'types', () => ({ values: [250, 5] }))), { code: 'unsupported-cell', found: 'cell of type 250, cell 1' }],
  ['a line beside triangles', write(unstructuredPiece(square, [[5, [0, 1, 2]], [3, [0, 1]]], { cells: [{ name: 'u', values: [1, 2] }] })), { code: 'mixed-cells', found: 'line, cell 2, beside a triangle' }],
  ['a polyhedron without faces', write(unstructuredPiece(square, [[42, [0, 1, 2, 3]]], { cells: [{ name: 'u', values: [1] }] })), { code: 'malformed-vtk', found: 'a polyhedron without its faces, cell 1' }],
  ['faces that end early', write(withPolyhedron(faces, 18)), { code: 'malformed-vtk', found: 'faceoffset 18 after 0, cell 1' }],
  ['faces that run on', write(withPolyhedron([5, ...faces.slice(1)], 17)), { code: 'malformed-vtk', found: 'faces beyond faceoffset 17, cell 1' }],
  ['a face of two points', write(withPolyhedron([1, 2, 0, 1], 4)), { code: 'malformed-vtk', found: 'a face of 2 points, cell 1' }],
  ['a face of another cell', write(withPolyhedron([4, 3, 0, 1, 9, ...faces.slice(5)], 17)), { code: 'malformed-vtk', found: 'point 9 in a face, cell 1' }],
];
const inline = (form: Partial<VtkForm> = {}) => write(whole(), { encoding: 'inline', ...form });
const raw = (form: Partial<VtkForm> = {}) => write(whole(), { encoding: 'raw', ...form });
/** Bytes overwritten, counted from after the underscore or from the end. */
function patched(bytes: Buffer, at: number, values: number[]): Buffer {
  const copy = Buffer.from(bytes);
  copy.set(values, at < 0 ? copy.length + at : copy.indexOf('\n_') + 2 + at);
  return copy;
}
// Of raw data without packing, p comes first: a length of 4 bytes and 32 bytes; then u, Points and Cells.
const bytes: Case[] = [
  ['a character that is none of base64', edited(/(Name="u".*\n)EAAAAA/, '$1EAAA!A', inline()), { code: 'malformed-vtk', line: 11, found: '“!” in base64 in “u” of cells' }],
  ['base64 that is cut off', edited(/(Name="u".*\n)EAAAAA.*\n/, '$1EAAAAA\n', inline()), { code: 'malformed-vtk', line: 11, found: 'the end within base64 in “u” of cells' }],
  ['base64 with less than its length says', edited(/(Name="u".*\n)EAAAAA.*\n/, '$1EAAAAAAA\n', inline()), { code: 'malformed-vtk', found: 'the end after 2 bytes in “u” of cells', expected: '16 bytes' }],
  ['base64 with more', edited(/(Name="u".*\nEAAAAA.*)\n/, '$1AAAAAAAA\n', inline()), { code: 'malformed-vtk', found: 'more data than its length says in “u” of cells' }],
  ['a length that does not fit', patched(raw(), 36, [8, 0, 0, 0]), { code: 'malformed-vtk', found: '1 values in “u” of cells', expected: '2' }],
  ['a length of no whole number', patched(raw(), 36, [13, 0, 0, 0]), { code: 'malformed-vtk', found: '5 bytes beyond the last number in “u” of cells' }],
  ['a length beyond the next array', patched(raw(), 36, [255, 255, 255, 255]), { code: 'malformed-vtk', found: 'the end after 16 bytes in “u” of cells' }],
  ['an offset within another array', edited('offset="56"', 'offset="40"', raw()), { code: 'malformed-vtk', line: 9, found: 'the end after 0 bytes in “u” of cells' }],
  ['an offset beyond the end', edited('offset="36"', 'offset="99999"', raw()), { code: 'malformed-vtk', line: 9, found: expect.stringMatching(/^the end after \d+ bytes of AppendedData in “u” of cells$/) as string }],
  ['an offset that is none', edited('offset="36"', 'offset="x"', raw()), { code: 'malformed-vtk', line: 9, found: 'offset “x”' }],
  ['appended data cut off', raw().subarray(0, -60), { code: 'malformed-vtk' }],
  ['the end cut off', raw().subarray(0, -12), { code: 'malformed-vtk', found: 'the end of the file', expected: '</AppendedData> and </VTKFile>' }],
  ['no underscore', edited('\n_', '\n ', raw()), { code: 'malformed-vtk', expected: 'an underscore' }],
];

describe.each([['tags', tags], ['numbers', numbers], ['geometry', geometry], ['bytes', bytes]] as const)('VTK XML with damaged %s', (_, cases) => {
  it.each(cases)('%s is refused with the place', async (_what, content, reason) => {
    const reasons = await readReasons(content, ['x', 'volume', 'u']);
    expect(reasons.slice(0, 1)).toMatchObject([reason]);
  });
});

describe('VTK XML', () => {
  it('with a block that does not unpack, or to another length, is refused', async () => {
    const good = raw({ block: 4096 });
    expect(await readReasons(patched(good, 0, [255, 255, 255, 255]), ['p'])).toMatchObject([{ code: 'malformed-vtk', found: '4294967295 blocks in “p” of points' }]);
    const at = good.indexOf('\n_') + 2;
    const first = good.subarray(at);
    // p: one block of 4096 bytes, the last of 32, and its packed length; then the block.
    expect([first.readUInt32LE(0), first.readUInt32LE(4), first.readUInt32LE(8)]).toEqual([1, 4096, 32]);
    expect(await readReasons(patched(good, 18, [1, 2, 3, 4, 5]), ['p'])).toMatchObject([{ code: 'malformed-vtk', found: expect.stringMatching(/^block 1, which does not unpack \(/) as string }]);
    expect(await readReasons(patched(good, 8, [24, 0, 0, 0]), ['p'])).toMatchObject([{ code: 'malformed-vtk', found: expect.stringMatching(/^block 1, which does not unpack/) as string, expected: '24 bytes packed by zlib' }]);
    expect(await readReasons(patched(good, 8, [40, 0, 0, 0]), ['p'])).toMatchObject([{ code: 'malformed-vtk', found: '32 bytes out of block 1 in “p” of points', expected: '40 bytes' }]);
  });

  it('that unpacks without end is given up', async () => {
    const zeros = deflateSync(Buffer.alloc(8e6));
    const block = Buffer.concat([Buffer.from(Uint32Array.of(1, 8e6, 0, zeros.length).buffer), zeros]);
    const names = Array.from({ length: 10 }, (_, at) => `u${at}`);
    const arrays = names.map((name, at) => `<DataArray type="Float64" Name="${name}" format="appended" offset="${at * block.length}"/>`);
    const content = Buffer.concat([
      Buffer.from(`<VTKFile type="ImageData" byte_order="LittleEndian" compressor="vtkZLibDataCompressor"><ImageData><Piece Extent="0 999999 0 0 0 0"><PointData>${arrays.join('')}</PointData></Piece></ImageData><AppendedData encoding="raw">_`),
      ...names.map(() => block), Buffer.from('</AppendedData></VTKFile>'),
    ]);
    expect(await readReasons(content, names)).toMatchObject([{ code: 'expands-too-far', found: expect.stringMatching(/^more than 6\d MB from the first/) as string }]);
  });

  it('of an inverted cell is refused with its row', async () => {
    const { columns } = await readTable(write(unstructuredPiece([[0, 0, 0], [1, 0, 0], [0, 1, 0], [0, 0, 1]], [[10, [0, 2, 1, 3]]], { cells: [{ name: 'u', values: [1] }] })), ['volume']);
    expect(columns[0]?.[0]).toBeCloseTo(-1 / 6, 14);
  });

  it.each(['found-nested.vtu', 'found-spliced.vtu'])('as fuzzing made it (%s) is rejected, also where it is only shown', async (file) => {
    const content = readFileSync(`fixtures/vtk/${file}`);
    expect(await readReasons(content, ['x', 'volume', 'u'])).toMatchObject([{ code: 'malformed-vtk' }]);
    await expect(readPreview(byteSource(content))).rejects.toBeInstanceOf(RejectedFile);
  });

  it('whatever is overwritten or cut off is read or rejected', async () => {
    const forms: VtkForm[] = [{ encoding: 'ascii' }, { encoding: 'inline' }, { encoding: 'inline', block: 16 }, { encoding: 'raw' }, { encoding: 'raw', block: 16 }, { encoding: 'base64', block: 16 }];
    await fc.assert(fc.asyncProperty(fc.constantFrom(...forms), fc.array(fc.tuple(fc.nat(), fc.nat(255)), { maxLength: 4 }), fc.option(fc.nat()), async (form, changes, end) => {
      const content = write(whole(), form);
      for (const [at, value] of changes) content[at % content.length] = value;
      const part = end === null ? content : content.subarray(0, end % content.length);
      await readReasons(part, ['x', 'volume', 'u']);
      await readPreview(byteSource(part)).catch((error: unknown) => {
        if (!(error instanceof RejectedFile)) throw error;
      });
    }), { numRuns: 500 });
  });
});
