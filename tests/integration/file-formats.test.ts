import { gzipSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { wholeFields } from '@/lib/domain/assessment/whole-fields';
import { getGridResultContract } from '@/lib/domain/studies/schema';
import { previewContract } from '@/lib/domain/uploads/schema';
import { ok } from '@/tests/support/api';
import { otherFormats, parsePrinted, type PrintedTable } from '@/tests/support/other-formats';
import { signUp } from '@/tests/support/people';
import { makeSolverStudy } from '@/tests/support/solver-study';
import { readSolverFile, readSolverSet } from '@/tests/support/solver-set';
import { awaitOutcome, awaitStudy, putFile } from '@/tests/support/study';

const set = 'G1_formats';

/** The table of a file of that set, whatever separates it. */
function tableOf(file: string): PrintedTable {
  if (file.endsWith('.json')) {
    const columns = JSON.parse(readSolverFile(set, file).toString('utf8')) as Record<string, number[]>;
    return { names: Object.keys(columns), columns: Object.values(columns).map((values) => values.map(String)) };
  }
  const text = readSolverFile(set, file).toString('utf8').replace(/^\uFEFF/, '').replaceAll('\r\n', '\n');
  return parsePrinted(text.replaceAll(/[;\t]/g, ','));
}

async function write(format: string, file: string): Promise<Buffer> {
  return Buffer.from(await otherFormats[format]?.(tableOf(file)) ?? '');
}

describe('a study of files in several formats', () => {
  it('comes to the outcome of its tables, and says what is wrong with a file that was cut off', async () => {
    const engineer = await signUp('Several formats');
    const { study } = await makeSolverStudy(engineer, set);
    const { expected, meta } = readSolverSet(set);
    const put = (label: string, bytes: Buffer) => putFile(engineer, { id: study.id, label }, bytes);

    await put('n12', (await write('HDF5', 'grid_2.csv')).subarray(0, 3000));
    const rejected = await awaitStudy(engineer, study.id, ({ grids }) => grids.some(({ label, state }) => label === 'n12' && state === 'rejected'));
    expect(rejected.grids.find(({ label }) => label === 'n12')?.upload?.reasons).toMatchObject([{ code: 'damaged-file', found: expect.stringContaining('truncated file') as string }]);

    await put('n6', readSolverFile(set, 'alt_grid_1.h5.json'));
    const packed = await put('n12', await write('HDF5 in packed chunks', 'grid_2.csv'));
    await put('n24', gzipSync(await write('HDF5', 'grid_3.tsv')));
    await put('n48', await write('JSON records', 'grid_4.json'));
    const { assessment } = await awaitOutcome(engineer, study.id);
    expect(await ok(engineer, previewContract, { params: { id: packed.id } })).toMatchObject({ format: 'hdf5', header: ['fields/u', 'fields/w', 'fields/x', 'fields/y'] });
    for (const [label, grid] of [['n6', 0], ['n12', 1], ['n24', 2], ['n48', 3]] as const) {
      const { rows, fields: [u] } = await ok(engineer, getGridResultContract, { params: { id: study.id, label } });
      const known = expected.grids[grid];
      expect(rows).toBe(known?.N_rows);
      for (const norm of ['L1', 'L2', 'Linf'] as const) expect((u?.[norm] ?? 0) / (known?.fields.u?.[norm] ?? 0)).toBeCloseTo(1, 9);
    }
    const wanted = meta.fields.u?.expected_outcome;
    expect(wholeFields(assessment.fields).map(({ norm, outcome, reasons }) => [norm, outcome, ...reasons]).sort())
      .toEqual((['L1', 'L2', 'Linf'] as const).map((norm) => [norm, wanted?.[norm].outcome, wanted?.[norm].reason]));
  });
});
