import { describe, expect, it } from 'vitest';
import type { GridReading } from '@/lib/readers/grid-reading';
import { readGrid } from '@/lib/readers/read-grid';
import { byteSource } from '@/tests/support/byte-source';
import { readTable } from '@/tests/support/read-table';
import { readSolverFile, readSolverSet, type SetMeta } from '@/tests/support/solver-set';
import { unstructuredPiece, writeVtk, type VtkForm } from '@/tests/support/vtk-writer';

const forms: VtkForm[] = [{ encoding: 'ascii' }, { encoding: 'raw', block: 32_768 }, { encoding: 'inline', header: 'UInt64' }, { encoding: 'base64', block: 32_768, bigEndian: true }];

const readingOf = ({ fields, dimension, parameters, time }: SetMeta, weight: string): GridReading => ({
  mapping: { x: 'x', y: 'y', weight, fields: Object.fromEntries(Object.keys(fields).map((field) => [field, field])) },
  problem: { dimension, exact: Object.fromEntries(Object.entries(fields).map(([field, { exact }]) => [field, exact])), constants: parameters },
  fields: Object.keys(fields).map((field) => ({ field })), ...(time !== null && { t: time }),
});
const norms = async (bytes: Uint8Array, reading: GridReading) => (await readGrid(byteSource(bytes), reading)).norms;

describe.each([
  'A1_poisson_p1_node', 'C1_tgv_grid', 'D1_laplace_orthogonal', 'D2_laplace_nonorth_corrected', 'D3_laplace_nonorth_uncorrected', 'F1_plateau', 'F2_source_bug',
])('%s', (id) => {
  const { meta } = readSolverSet(id);
  const names = Object.keys(meta.fields);
  const rowsOf = async (file: string) => (await readTable(readSolverFile(id, file), ['x', 'y', meta.weight, ...names])).columns;

  it('has the columns of the table to the bit, and its norms, as values at points in every encoding', async () => {
    for (const [index, { file }] of meta.grids.slice(0, 4).entries()) {
      const form = forms[index] ?? { encoding: 'ascii' };
      const rows = await rowsOf(file);
      const [x = [], y = [], weight = [], ...values] = rows;
      const data = { points: [{ name: 'w', values: weight }, ...names.map((name, at) => ({ name, values: values[at] ?? [] }))] };
      const bytes = writeVtk({ kind: 'UnstructuredGrid', pieces: [unstructuredPiece(x.map((at, row) => [at, y[row] ?? NaN, 0]), [], data)] }, form);
      expect((await readTable(bytes, ['x', 'y', 'points/w', ...names])).columns).toEqual(rows);
      const [table, found] = [await norms(readSolverFile(id, file), readingOf(meta, meta.weight)), await norms(bytes, readingOf(meta, 'points/w'))];
      expect(found.rows).toBe(table.rows);
      expect(found.fields.every(({ significantDigits }) => (significantDigits === null) === (form.encoding !== 'ascii'))).toBe(true);
      for (const [at, field] of found.fields.entries()) {
        // Rows come in other batches, so that sums are added up in another order.
        for (const norm of ['L1', 'L2', 'Linf'] as const) expect(Math.abs(field[norm] / (table.fields[at]?.[norm] ?? NaN) - 1)).toBeLessThan(1e-14);
        expect(field.at).toEqual(table.fields[at]?.at);
      }
    }
  });
});

describe.each(['C1_tgv_grid', 'D1_laplace_orthogonal', 'F1_plateau', 'F2_source_bug'])('%s as cells', (id) => {
  const { meta } = readSolverSet(id);
  const names = Object.keys(meta.fields);
  const { file, n } = meta.grids[1] ?? { file: '', n: 0 };
  const [[left = 0, right = 1] = [], [low = 0, high = 1] = []] = [meta.domain.x, meta.domain.y];
  const line = (from: number, to: number) => Array.from({ length: n + 1 }, (_, at) => from + ((to - from) * at) / n);

  it('has the centres and volumes that the solver wrote, and the norms', async () => {
    const [x = [], y = [], volume = [], ...values] = (await readTable(readSolverFile(id, file), ['x', 'y', meta.weight, ...names])).columns;
    const [xs, ys] = [line(left, right), line(low, high)];
    // The cell of each row by its centre: solvers number them either way.
    const cells = x.map((at, row): [number, number] => [Math.floor(((at - left) / (right - left)) * n), Math.floor((((y[row] ?? NaN) - low) / (high - low)) * n)]);
    const quads = cells.map(([i, j]): readonly [number, readonly number[]] => {
      const first = j * (n + 1) + i;
      return [9, [first, first + 1, first + n + 2, first + n + 1]];
    });
    const data = { cells: names.map((name, at) => ({ name, values: values[at] ?? [] })) };
    const bytes = writeVtk({ kind: 'UnstructuredGrid', pieces: [unstructuredPiece(ys.flatMap((b) => xs.map((a) => [a, b, 0])), quads, data)] }, { encoding: 'raw', block: 32_768 });
    const found = (await readTable(bytes, ['x', 'y', 'volume'])).columns;
    for (const [at, known] of [x, y, volume].entries()) expect(known.every((value, row) => Math.abs((found[at]?.[row] ?? NaN) - value) < 1e-12)).toBe(true);
    const [table, grid] = [await norms(readSolverFile(id, file), readingOf(meta, meta.weight)), await norms(bytes, readingOf(meta, 'volume'))];
    for (const [at, field] of grid.fields.entries()) {
      for (const norm of ['L1', 'L2', 'Linf'] as const) expect(Math.abs(field[norm] / (table.fields[at]?.[norm] ?? NaN) - 1)).toBeLessThan(1e-9);
    }
  });
});
