import { gzipSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { createStudyContract, getGridResultContract } from '@/lib/domain/studies/schema';
import { previewContract } from '@/lib/domain/uploads/schema';
import { ok } from '@/tests/support/api';
import { heatSizes } from '@/tests/support/grids';
import { signUp } from '@/tests/support/people';
import { awaitOutcome, awaitStudy, putFile } from '@/tests/support/study';
import { unstructuredPiece, writeVtk, type VtkArray, type VtkPiece } from '@/tests/support/vtk-writer';
import { makeWork } from '@/tests/support/work';

const line = (n: number) => Array.from({ length: n + 1 }, (_, at) => at / n);
/** T in the cells of some rows of n × n, off the exact solution by 0.3·h². */
const valuesOf = (n: number, rows: readonly number[]): number[] => rows.flatMap((j) => Array.from({ length: n }, (_, i) => {
  const [x, y] = [(i + 0.5) / n, (j + 0.5) / n];
  return Math.sin(Math.PI * x) * Math.sin(Math.PI * y) + 0.5 * x + 0.3 / (n * n) * (1 + 0.5 * Math.sin(Math.PI * x));
}));

/** Rows of quads of n × n, from one on, with marks where given. */
function quads(n: number, from: number, to: number, ghost?: number): VtkPiece {
  const rows = Array.from({ length: to - from }, (_, at) => from + at);
  const points = line(n).slice(from, to + 1).flatMap((y) => line(n).map((x) => [x, y, 0]));
  const cells = rows.flatMap((_, j) => Array.from({ length: n }, (_all, i): readonly [number, readonly number[]] => {
    const first = j * (n + 1) + i;
    return [9, [first, first + 1, first + n + 2, first + n + 1]];
  }));
  const marks: VtkArray[] = ghost === undefined ? [] : [{ name: 'vtkGhostType', type: 'UInt8', values: rows.flatMap((j) => Array<number>(n).fill(Number(j === ghost))) }];
  return unstructuredPiece(points, cells, { cells: [{ name: 'T', values: valuesOf(n, rows) }, ...marks] });
}
const whole = (n: number) => quads(n, 0, n);
const straight = (n: number): VtkPiece => ({
  attributes: { Extent: `0 ${n} 0 ${n} 0 0` },
  sections: { CellData: [{ name: 'T', values: valuesOf(n, Array.from({ length: n }, (_, j) => j)) }], Coordinates: [line(n), line(n), [0]].map((values, at) => ({ name: `axis ${at}`, values })) },
});

describe('a study of VTK grids', () => {
  it('comes to its outcome, says what is wrong with a file, and counts the cells that two pieces share', async () => {
    const engineer = await signUp('VTK grids');
    const work = await makeWork(engineer);
    const study = await ok(engineer, createStudyContract, {
      body: { case: work.case.slug, release: '1.0.0', grids: heatSizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n })) },
    });
    const put = (label: string, bytes: Buffer) => putFile(engineer, { id: study.id, label }, bytes);

    const curved = whole(8);
    const types = curved.sections.Cells?.find(({ name }) => name === 'types');
    if (types) types.values = types.values.map((type, at) => (at === 40 ? 23 : type));
    await put('n8', writeVtk({ kind: 'UnstructuredGrid', pieces: [curved] }, { encoding: 'inline' }));
    const rejected = await awaitStudy(engineer, study.id, ({ grids }) => grids.some(({ state }) => state === 'rejected'));
    expect(rejected.grids.find(({ label }) => label === 'n8')?.upload?.reasons).toMatchObject([{ code: 'unsupported-cell', found: 'quadratic quad, cell 41' }]);

    const { id } = await put('n8', writeVtk({ kind: 'UnstructuredGrid', pieces: [quads(8, 0, 5, 4), quads(8, 3, 8, 3)] }, { encoding: 'raw', block: 512, shuffled: true }));
    await put('n16', writeVtk({ kind: 'RectilinearGrid', pieces: [straight(16)] }, { encoding: 'ascii' }));
    await put('n32', gzipSync(writeVtk({ kind: 'UnstructuredGrid', pieces: [whole(32)] }, { encoding: 'base64', header: 'UInt64' })));
    await put('n64', writeVtk({ kind: 'UnstructuredGrid', pieces: [whole(64)] }, { encoding: 'raw', block: 32_768 }));

    const { outcome, assessment } = await awaitOutcome(engineer, study.id);
    expect({ outcome, rows: assessment.inputs.map(({ rows }) => rows) }).toEqual({ outcome: 'pass', rows: expect.arrayContaining(heatSizes.map((n) => n * n)) as number[] });
    expect(await ok(engineer, previewContract, { params: { id } })).toMatchObject({ format: 'vtk', dialect: 'VTK XML', header: ['x', 'y', 'z', 'volume', 'cells/T'], missing: [] });
    const result = await ok(engineer, getGridResultContract, { params: { id: study.id, label: 'n8' } });
    expect(result).toMatchObject({ rows: 64, rowsLeftOut: 16, mapping: { x: 'x', y: 'y', weight: 'volume', fields: { T: 'cells/T' } } });
    expect(result.weightSum).toBeCloseTo(1, 12);
    expect((await awaitStudy(engineer, study.id, () => true)).grids.find(({ label }) => label === 'n8')?.upload).toMatchObject({ rows: 64, rowsLeftOut: 16 });
  });
});
