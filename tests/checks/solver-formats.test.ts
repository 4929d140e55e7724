import { gzipSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import type { GridReading } from '@/lib/readers/grid-reading';
import { readGrid } from '@/lib/readers/read-grid';
import type { GridNorms } from '@/lib/numerics/norms/grid-norms';
import { byteSource } from '@/tests/support/byte-source';
import { otherFormats, parsePrinted } from '@/tests/support/other-formats';
import { readSolverFile, readSolverSet, type SetMeta } from '@/tests/support/solver-set';

// Every series of fixtures/solver-output in every format: norms as of its text table, which are those of an independent script (solver-norms.test.ts).
const sets = [
  'A1_poisson_p1_node', 'C1_tgv_grid', 'D1_laplace_orthogonal', 'D2_laplace_nonorth_corrected', 'D3_laplace_nonorth_uncorrected', 'F1_plateau', 'F2_source_bug',
];

function readingOf(meta: SetMeta): GridReading {
  const fields = Object.keys(meta.fields);
  return {
    mapping: { x: 'x', y: 'y', weight: meta.weight, fields: Object.fromEntries(fields.map((name) => [name, name])) },
    problem: { dimension: 2, constants: meta.parameters, exact: Object.fromEntries(fields.map((name) => [name, meta.fields[name]?.exact ?? ''])) },
    fields: fields.map((field) => ({ field })), t: meta.time ?? undefined,
  };
}

const normsOf = async (content: string | Uint8Array, reading: GridReading) => (await readGrid(byteSource(content), reading)).norms;

/** Sums may be added up in another order: that of a table goes by its chunks. */
function expectSame(found: GridNorms, expected: GridNorms): void {
  expect({ rows: found.rows, equalWeights: found.equalWeights }).toEqual({ rows: expected.rows, equalWeights: expected.equalWeights });
  const near = (value: number, other: number) => expect(Math.abs(value - other)).toBeLessThanOrEqual(1e-12 * Math.abs(other));
  near(found.weightSum, expected.weightSum);
  for (const [index, { field, L1, L2, Linf, at, min, max, count }] of found.fields.entries()) {
    const same = expected.fields[index];
    if (!same) throw new Error(`no norms of ${field}`);
    near(L1, same.L1);
    near(L2, same.L2);
    expect({ field, Linf, at, min, max, count }).toEqual({ field: same.field, Linf: same.Linf, at: same.at, min: same.min, max: same.max, count: same.count });
  }
}

describe.each(sets)('norms of %s are those of its tables in every format', (set) => {
  const { meta } = readSolverSet(set);
  it.each(meta.grids.map(({ file }) => file))('%s', async (file) => {
    const csv = readSolverFile(set, file);
    const reading = readingOf(meta);
    const expected = await normsOf(csv, reading);
    const table = parsePrinted(csv.toString('utf8'));
    const first = meta.grids[0]?.file === file;
    let digits: (number | null)[] | undefined;
    for (const [format, write] of Object.entries(otherFormats)) {
      const content = Buffer.from(await write(table));
      const norms = await normsOf(content, reading);
      expectSame(norms, expected);
      digits = format.startsWith('JSON') ? norms.fields.map(({ significantDigits }) => significantDigits) : digits;
      // What decompression does is the same for all grids.
      if (first) expect(await normsOf(gzipSync(content), reading)).toEqual(norms);
    }
    expect(digits).toEqual(expected.fields.map(({ significantDigits }) => significantDigits));
  });
});

describe('the alternates of G1_formats', () => {
  const { meta } = readSolverSet('G1_formats');
  it.each(['alt_grid_1.csv.gz', 'alt_grid_1.h5.json'])('%s has the norms of grid_1.dat', async (file) => {
    expectSame(await normsOf(readSolverFile('G1_formats', file), readingOf(meta)), await normsOf(readSolverFile('G1_formats', 'grid_1.dat'), readingOf(meta)));
  });

  it('grid_4.json has the same norms as records, HDF5/JSON and HDF5', async () => {
    const json = readSolverFile('G1_formats', 'grid_4.json');
    const columns = JSON.parse(json.toString('utf8')) as Record<string, number[]>;
    const table = { names: Object.keys(columns), columns: Object.values(columns).map((values) => values.map(String)) };
    const expected = await normsOf(json, readingOf(meta));
    for (const write of Object.values(otherFormats)) expectSame(await normsOf(Buffer.from(await write(table)), readingOf(meta)), expected);
  });
});
