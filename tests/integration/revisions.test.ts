import { beforeAll, describe, expect, it } from 'vitest';
import { updateProblemContract } from '@/lib/domain/problems/schema';
import {
  addGridContract, assessStudyContract, createStudyContract, getOutcomeContract, getStudyContract, reviseStudyContract, updateGridContract, type Grid, type Study,
} from '@/lib/domain/studies/schema';
import { deleteUploadContract, startUploadContract } from '@/lib/domain/uploads/schema';
import { ifMatch, ok, refused } from '@/tests/support/api';
import { heatTable } from '@/tests/support/grids';
import { addMember, signUp, type Person } from '@/tests/support/people';
import { awaitOutcome, awaitStudy, putFile } from '@/tests/support/study';
import { makeWork, type Work } from '@/tests/support/work';

let engineer: Person;
let work: Work;

const errorsOf = (n: number) => ({ T: { L2: 0.3 / (n * n), Linf: 0.5 / (n * n) } });
const typed = (n: number) => ({ label: `n${n}`, cellsPerDirection: n, errors: errorsOf(n) });
const gridOf = (study: Study, label: string): Grid => {
  const grid = study.grids.find((candidate) => candidate.label === label);
  if (!grid) throw new Error(`no grid ${label}`);
  return grid;
};

beforeAll(async () => {
  engineer = await signUp('Revisions');
  work = await makeWork(engineer);
});

const make = (grids: object[]) => ok(engineer, createStudyContract, { body: { case: work.case.slug, release: '1.0.0', grids } });
const read = (id: string, revision?: number) => ok(engineer, getStudyContract, { params: { id }, query: revision === undefined ? {} : { revision } });
const change = (id: string, grid: Grid, body: object) => ok(engineer, updateGridContract, { params: { id, label: grid.label }, body, ...ifMatch(grid.revision) });

describe('POST /api/v1/studies/{id}/grids', () => {
  it('adds a grid, marked where data came before it', async () => {
    const study = await make([8, 16].map((n) => ({ label: `n${n}`, cellsPerDirection: n })));
    const early = await ok(engineer, addGridContract, { params: { id: study.id }, body: { label: 'n32', cellsPerDirection: 32 } });
    expect(early).toMatchObject({ state: 'expected', afterData: false, revision: 1, excluded: null, upload: null });
    expect(await ok(engineer, addGridContract, { params: { id: study.id }, body: typed(64) })).toMatchObject({ state: 'typed', afterData: false });
    expect(await ok(engineer, addGridContract, { params: { id: study.id }, body: { label: 'n128', cellsPerDirection: 128 } })).toMatchObject({ afterData: true });
    expect((await read(study.id)).planFrozenAt).not.toBeNull();
  });

  it('refuses a label that is there, a field nobody declared, and an assessed study', async () => {
    const study = await make([8, 16, 32].map(typed));
    await awaitOutcome(engineer, study.id);
    const late = await refused(engineer, addGridContract, { params: { id: study.id }, body: typed(64) });
    expect(late).toMatchObject({ status: 409 });
    expect(late.detail).toContain('new revision');
    const open = await make([{ label: 'n8', cellsPerDirection: 8 }]);
    expect((await refused(engineer, addGridContract, { params: { id: open.id }, body: typed(8) })).status).toBe(409);
    expect((await refused(engineer, addGridContract, { params: { id: open.id }, body: { label: 'a', h: 1, errors: { q: { L2: 1 } } } })).status).toBe(422);
  });
});

describe('PATCH /api/v1/studies/{id}/grids/{label}', () => {
  it('leaves a grid out with a reason, takes it back in, and assesses once nothing is open', async () => {
    const study = await make([...[8, 16, 32, 64].map(typed), { label: 'n128', cellsPerDirection: 128 }]);
    const out = await change(study.id, gridOf(study, 'n8'), { exclude: 'Too coarse for the layer' });
    expect(out).toMatchObject({ excluded: 'Too coarse for the layer', revision: 2 });
    expect(await change(study.id, out, { exclude: null })).toMatchObject({ excluded: null, revision: 3 });
    await change(study.id, gridOf(study, 'n128'), { exclude: 'The run was stopped' });
    const { outcome, assessment } = await awaitOutcome(engineer, study.id);
    expect(outcome).toBe('pass');
    expect(assessment.fields[0]?.grids).toHaveLength(4);
  });

  it('types values over what was there, and marks a spacing changed after data', async () => {
    const study = await make([typed(8), { label: 'n16', cellsPerDirection: 16 }]);
    const changed = await change(study.id, gridOf(study, 'n16'), { cellsPerDirection: 20 });
    expect(changed).toMatchObject({ cellsPerDirection: 20, afterData: true, state: 'expected' });
    expect(await change(study.id, changed, { errors: errorsOf(20) })).toMatchObject({ state: 'typed' });
  });

  it('wants the revision that was read', async () => {
    const study = await make([8, 16].map((n) => ({ label: `n${n}`, cellsPerDirection: n })));
    const params = { id: study.id, label: 'n8' };
    expect((await refused(engineer, updateGridContract, { params, body: { exclude: 'x' } })).status).toBe(428);
    expect((await refused(engineer, updateGridContract, { params, body: { exclude: 'x' }, ...ifMatch(7) })).status).toBe(412);
    expect((await refused(engineer, updateGridContract, { params: { id: study.id, label: 'n9' }, body: { exclude: 'x' }, ...ifMatch(1) })).status).toBe(404);
  });
});

describe('POST /api/v1/studies/{id}/revisions', () => {
  it('keeps the file a grid had where another one is begun and given up in the next revision', async () => {
    const study = await make([8, 16, 32].map((n) => ({ label: `n${n}`, cellsPerDirection: n })));
    for (const n of [8, 16, 32]) await putFile(engineer, { id: study.id, label: `n${n}` }, heatTable(n));
    await awaitOutcome(engineer, study.id);
    const second = await ok(engineer, reviseStudyContract, { params: { id: study.id } });
    const { upload } = await ok(engineer, startUploadContract, { params: { id: study.id, label: 'n32' }, body: { filename: 'again.csv', bytes: 100 } });
    await ok(engineer, deleteUploadContract, { params: { id: upload } });
    expect(gridOf(await read(study.id), 'n32').upload?.id).toBe(gridOf(second, 'n32').upload?.id);
    expect(await awaitOutcome(engineer, study.id)).toMatchObject({ revision: 2 });
  });

  it('carries grids, files and results over, and one grid more changes the outcome', async () => {
    const study = await make([8, 16, 32].map((n) => ({ label: `n${n}`, cellsPerDirection: n })));
    for (const n of [8, 16, 32]) await putFile(engineer, { id: study.id, label: `n${n}` }, heatTable(n));
    expect((await awaitOutcome(engineer, study.id)).outcome).toBe('inconclusive');
    const first = await read(study.id);
    expect(first.assessment?.fields[0]?.reasons).toEqual(['too-few-grids']);

    const second = await ok(engineer, reviseStudyContract, { params: { id: study.id } });
    expect(second).toMatchObject({ state: 'collecting', revision: 2, currentRevision: 2, assessment: null, definitionAfterData: false });
    expect(second.grids.map(({ label, state, upload }) => [label, state, upload?.sha256])).toEqual(
      first.grids.map(({ label, upload }) => [label, 'read', upload?.sha256]),
    );
    expect(await ok(engineer, addGridContract, { params: { id: study.id }, body: { label: 'n64', cellsPerDirection: 64 } })).toMatchObject({ afterData: true });
    await putFile(engineer, { id: study.id, label: 'n64' }, heatTable(64));
    expect(await awaitOutcome(engineer, study.id)).toMatchObject({ revision: 2, outcome: 'pass' });
    expect(await read(study.id, 1)).toMatchObject({ revision: 1, currentRevision: 2, state: 'assessed', assessment: first.assessment });
  });

  it('reads the files again where the problem has changed since', async () => {
    const study = await make([8, 16, 32, 64].map((n) => ({ label: `n${n}`, cellsPerDirection: n })));
    for (const n of [8, 16, 32, 64]) await putFile(engineer, { id: study.id, label: `n${n}` }, heatTable(n));
    expect((await awaitOutcome(engineer, study.id)).outcome).toBe('pass');
    await ok(engineer, updateProblemContract, { params: { problem: work.problem.slug }, body: { exact: { T: 'sin(pi*x)*sin(pi*y) + k*x + 1' } }, ...ifMatch(1) });
    const second = await ok(engineer, reviseStudyContract, { params: { id: study.id } });
    expect(second).toMatchObject({ problem: { revision: 2 }, definitionAfterData: true });
    expect(await awaitOutcome(engineer, study.id)).toMatchObject({ revision: 2, outcome: 'fail' });
    expect(await read(study.id, 1)).toMatchObject({ problem: { revision: 1, currentRevision: 2 }, definitionAfterData: false });
  });

  it('is the way on where grids cannot be put in a row: the assessment fails in words', async () => {
    const study = await make([typed(8), { ...typed(16), label: 'file', errors: undefined }]);
    await ok(engineer, addGridContract, { params: { id: study.id }, body: { label: 'same', cellsPerDirection: 8, errors: errorsOf(8) } });
    await change(study.id, gridOf(study, 'file'), { exclude: 'Not run' });
    const failed = await awaitStudy(engineer, study.id, ({ state }) => state === 'assessment-failed');
    expect(failed.failure).toMatch(/Grid (same|n8): h = 0.125, as grid/);
    const problem = await refused(engineer, getOutcomeContract, { params: { id: study.id } });
    expect(problem).toMatchObject({ status: 409, errors: [{ path: 'assessment' }] });
    await ok(engineer, assessStudyContract, { params: { id: study.id } });
    await awaitStudy(engineer, study.id, ({ state }) => state === 'assessment-failed');
    const second = await ok(engineer, reviseStudyContract, { params: { id: study.id } });
    const same = await change(study.id, gridOf(second, 'same'), { cellsPerDirection: 12, errors: errorsOf(12) });
    expect(same.afterData).toBe(true);
    await awaitStudy(engineer, study.id, ({ state }) => state === 'assessed');
  });

  it('is refused while there is nothing to leave behind, and for a reviewer', async () => {
    const study = await make([{ label: 'n8', cellsPerDirection: 8 }]);
    expect((await refused(engineer, reviseStudyContract, { params: { id: study.id } })).status).toBe(409);
    const reviewer = await addMember(engineer.at, ['reviewer']);
    expect((await refused(reviewer, reviseStudyContract, { params: { id: study.id } })).status).toBe(403);
  });
});
