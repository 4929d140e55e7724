import { describe, expect, it } from 'vitest';
import { readGrid } from '@/lib/readers/read-grid';

const side = 1450;
const [cells, points] = [side * side, (side + 1) ** 2];

interface Column { tag: string; end: string; count: number; bytes: number; value: (at: number) => number; room: () => Float64Array | Int32Array | Uint8Array }
const corners = [0, 1, side + 2, side + 1];
const columns: Column[] = [
  { tag: '<CellData><DataArray type="Float64" Name="u"', end: '</CellData>', count: cells, bytes: 8, value: (at) => at % 7, room: () => new Float64Array(8192) },
  { tag: '<Points><DataArray type="Float64" Name="Points" NumberOfComponents="3"', end: '</Points>', count: 3 * points, bytes: 8, value: coordinate, room: () => new Float64Array(8193) },
  { tag: '<Cells><DataArray type="Int32" Name="connectivity"', end: '', count: 4 * cells, bytes: 4, value: (at) => Math.floor((at >> 2) / side) * (side + 1) + ((at >> 2) % side) + (corners[at & 3] ?? 0), room: () => new Int32Array(8192) },
  { tag: '<DataArray type="Int32" Name="offsets"', end: '', count: cells, bytes: 4, value: (at) => 4 * at + 4, room: () => new Int32Array(8192) },
  { tag: '<DataArray type="UInt8" Name="types"', end: '</Cells>', count: cells, bytes: 1, value: () => 9, room: () => new Uint8Array(8192) },
];

function coordinate(at: number): number {
  const point = Math.floor(at / 3);
  if (at % 3 === 0) return (point % (side + 1)) / side;
  return at % 3 === 1 ? Math.floor(point / (side + 1)) / side : 0;
}

/** Squares that fill the unit square, one after another. */
function* grid(): Generator<Buffer> {
  yield Buffer.from(`<VTKFile type="UnstructuredGrid" byte_order="LittleEndian" header_type="UInt64"><UnstructuredGrid><Piece NumberOfPoints="${points}" NumberOfCells="${cells}">`);
  let offset = 0;
  for (const { tag, end, count, bytes } of columns) {
    yield Buffer.from(`${tag} format="appended" offset="${offset}"/>${end}`);
    offset += 8 + count * bytes;
  }
  yield Buffer.from('</Piece></UnstructuredGrid><AppendedData encoding="raw">_');
  for (const { count, bytes, value, room } of columns) {
    yield Buffer.from(BigUint64Array.of(BigInt(count * bytes)).buffer);
    const values = room();
    for (let from = 0; from < count; from += values.length) {
      const some = Math.min(values.length, count - from);
      for (let at = 0; at < some; at += 1) values[at] = value(from + at);
      yield Buffer.from(values.buffer, 0, some * bytes);
    }
  }
  yield Buffer.from('</AppendedData></VTKFile>');
}

describe('a grid of two million cells', () => {
  it('is read with a part of it in memory', async () => {
    let peak = 0;
    async function* source(): AsyncGenerator<Buffer> {
      for (const bytes of grid()) yield await Promise.resolve(bytes);
    }
    const reading = {
      mapping: { x: 'x', y: 'y', weight: 'volume', fields: { u: 'u' } }, problem: { dimension: 2, exact: { u: '3' }, constants: {} }, fields: [{ field: 'u' }],
    } as const;
    const before = process.memoryUsage().arrayBuffers;
    const { norms } = await readGrid(source(), { ...reading, mapping: { ...reading.mapping } }, {
      onProgress() {
        peak = Math.max(peak, process.memoryUsage().arrayBuffers - before);
      },
    });
    expect(norms.rows).toBe(cells);
    expect(norms.weightSum).toBeCloseTo(1, 10);
    expect(norms.fields[0]?.L2).toBeCloseTo(2, 2);
    // All numbers together take 170 MB; 32 are held of columns, 48 of points, the rest is what has not been collected yet.
    expect(peak).toBeLessThan(130e6);
  });
});
