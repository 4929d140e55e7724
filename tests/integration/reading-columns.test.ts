import { beforeAll, describe, expect, it } from 'vitest';
import { createCaseContract, putColumnsContract, type Case } from '@/lib/domain/cases/schema';
import type { QueryOf } from '@/lib/domain/api/contract';
import { listRechecksContract, requestRecheckContract } from '@/lib/domain/studies/recheck-schema';
import { createStudyContract, getGridResultContract, type Study } from '@/lib/domain/studies/schema';
import { previewContract } from '@/lib/domain/uploads/schema';
import { ok, refused } from '@/tests/support/api';
import { heatSizes, heatTable } from '@/tests/support/grids';
import { signUp, type Person } from '@/tests/support/people';
import { awaitOutcome, awaitStudy, putFile } from '@/tests/support/study';
import { makeWork, orderCase, type Work } from '@/tests/support/work';

let engineer: Person;
let work: Work;

beforeAll(async () => {
  engineer = await signUp('Columns');
  work = await makeWork(engineer);
});

const makeCase = (name: string): Promise<Case> => ok(engineer, createCaseContract, { body: { ...orderCase, name, code: work.code.slug, problem: work.problem.slug } });
const make = (of: Case): Promise<Study> => ok(engineer, createStudyContract, {
  body: { case: of.slug, release: '1.0.0', grids: heatSizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n })) },
});
const settled = (study: Study) => study.grids.every(({ state }) => !['stored', 'reading'].includes(state));

/** The heat table with semicolons, decimal commas, and numbers for names, which looks as if it had none. */
const numberedTable = (n: number): Buffer => Buffer.from(heatTable(n, { header: '1,2,3,4' }).toString()
  .replaceAll(',', ';').replaceAll('.', ','));

describe('a table that is written otherwise than it looks', () => {
  it('is shown as it would be read, before that is kept, and then read so', async () => {
    const made = await makeCase('Numbers for names');
    const study = await make(made);
    const { id } = await putFile(engineer, { id: study.id, label: 'n8' }, numberedTable(8));
    await awaitStudy(engineer, study.id, settled);
    const look = (query: QueryOf<typeof previewContract>) => ok(engineer, previewContract, { params: { id }, query });
    expect(await look({})).toMatchObject({
      header: ['c1', 'c2', 'c3', 'c4'], dialect: 'Semicolon between columns, decimal comma, no line of names',
      table: { delimiter: 'semicolon', hasHeader: false, headerLine: null, decimalMark: 'comma', given: {} },
    });
    expect(await look({ header: 'yes' })).toMatchObject({
      header: ['1', '2', '3', '4'], firstRows: { 0: { 0: '0,0625' } }, dialect: 'Semicolon between columns, decimal comma, names in line 1', table: { given: { hasHeader: true } },
    });
    expect(await look({ delimiter: 'tab' })).toMatchObject({ header: ['1;2;3;4'], table: { delimiter: 'tab', given: { delimiter: 'tab' } } });
    const both = await refused(engineer, previewContract, { params: { id }, query: { delimiter: 'comma', decimal: 'comma' } });
    expect(both).toMatchObject({ status: 422, errors: [{ path: 'decimal' }] });

    const body = { x: '1', y: '2', weight: '3', fields: { T: '4' } };
    const refusedBody = await refused(engineer, putColumnsContract, { params: { case: made.slug }, body: { ...body, table: { delimiter: 'comma', decimalMark: 'comma' } } });
    expect(refusedBody).toMatchObject({ status: 422, errors: [{ path: 'table.decimalMark' }] });
    const table = { hasHeader: true, decimalMark: 'point' } as const;
    await ok(engineer, putColumnsContract, { params: { case: made.slug }, body: { ...body, table } });
    const rejected = await awaitStudy(engineer, study.id, ({ grids }) => grids.some(({ state }) => state === 'rejected'));
    expect(rejected.grids.find(({ label }) => label === 'n8')?.upload?.reasons).toMatchObject([{ code: 'mixed-decimal', line: 2, column: 1, found: '0,0625' }]);
    expect(await look({ header: 'auto' })).toMatchObject({ header: ['c1', 'c2', 'c3', 'c4'], table: { given: {} } });

    await ok(engineer, putColumnsContract, { params: { case: made.slug }, body: { ...body, table: { hasHeader: true } } });
    for (const n of heatSizes.slice(1)) await putFile(engineer, { id: study.id, label: `n${n}` }, numberedTable(n));
    expect((await awaitOutcome(engineer, study.id)).outcome).toBe('pass');
    const result = await ok(engineer, getGridResultContract, { params: { id: study.id, label: 'n8' } });
    expect(result.mapping).toEqual({ ...body, table: { hasHeader: true } });
    expect(await look({})).toMatchObject({ header: ['1', '2', '3', '4'], table: { given: { hasHeader: true } } });

    const again = await ok(engineer, requestRecheckContract, { params: { id: study.id } });
    await expect.poll(async () => (await ok(engineer, listRechecksContract, { params: { id: study.id } })).items.find((item) => item.id === again.id)?.result, { timeout: 20_000 }).toBe('identical');
  });
});

describe('a file whose columns have other names', () => {
  it('waits with its header and first rows, goes on when they are mapped, and the next study knows them', async () => {
    const made = await makeCase('Other names');
    const study = await make(made);
    for (const n of heatSizes) await putFile(engineer, { id: study.id, label: `n${n}` }, heatTable(n, { header: 'x,y,cellSize,Temperature' }));
    const waiting = await awaitStudy(engineer, study.id, settled);
    expect(waiting.state).toBe('collecting');
    expect(waiting.grids.map(({ state }) => state)).toEqual(heatSizes.map(() => 'needs-columns'));

    const id = waiting.grids.find(({ label }) => label === 'n8')?.upload?.id ?? '';
    const preview = await ok(engineer, previewContract, { params: { id } });
    expect(preview).toMatchObject({
      format: 'table', header: ['x', 'y', 'cellSize', 'Temperature'], mapping: null, proposal: { x: 'x', y: 'y' }, missing: ['T', 'weight'],
    });
    expect(preview.firstRows[0]?.slice(0, 3)).toEqual(['0.0625', '0.0625', '0.015625']);

    await ok(engineer, putColumnsContract, { params: { case: made.slug }, body: { x: 'x', y: 'y', weight: 'cellSize', fields: { T: 'Temperature' } } });
    expect((await awaitOutcome(engineer, study.id)).outcome).toBe('pass');
    const next = await make(made);
    await putFile(engineer, { id: next.id, label: 'n8' }, heatTable(8, { header: 'x,y,cellSize,Temperature' }));
    await awaitStudy(engineer, next.id, ({ grids }) => grids.some(({ state }) => state === 'read'));
  });

  it('is rejected where the mapping names a column it has not, and read once that is mended', async () => {
    const made = await makeCase('Wrong names');
    await ok(engineer, putColumnsContract, { params: { case: made.slug }, body: { x: 'x', y: 'y', weight: 'V', fields: { T: 'T' } } });
    const study = await make(made);
    await putFile(engineer, { id: study.id, label: 'n8' }, heatTable(8));
    const rejected = await awaitStudy(engineer, study.id, settled);
    const grid = rejected.grids.find(({ label }) => label === 'n8');
    expect(grid).toMatchObject({ state: 'rejected', upload: { reasons: [{ code: 'column-missing', line: 1, found: 'x, y, w, T', expected: 'V' }] } });
    await ok(engineer, putColumnsContract, { params: { case: made.slug }, body: { x: 'x', y: 'y', weight: null, fields: { T: 'T' } } });
    await awaitStudy(engineer, study.id, ({ grids }) => grids.some(({ state }) => state === 'read'));
    const result = await ok(engineer, getGridResultContract, { params: { id: study.id, label: 'n8' } });
    expect(result).toMatchObject({ equalWeights: true, weightSum: 64, mapping: { weight: null } });
  });

  it('without a header has numbered columns', async () => {
    const made = await makeCase('No header');
    const study = await make(made);
    const { id } = await putFile(engineer, { id: study.id, label: 'n8' }, heatTable(8, { header: '' }));
    await awaitStudy(engineer, study.id, settled);
    expect(await ok(engineer, previewContract, { params: { id } })).toMatchObject({ header: ['c1', 'c2', 'c3', 'c4'], missing: ['T', 'x', 'y', 'weight'] });
    const stranger = await signUp('Strangers');
    expect((await refused(stranger, previewContract, { params: { id } })).status).toBe(404);
  });
});
