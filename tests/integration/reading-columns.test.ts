import { beforeAll, describe, expect, it } from 'vitest';
import { createCaseContract, putColumnsContract, type Case } from '@/lib/domain/cases/schema';
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
