import { beforeAll, describe, expect, it } from 'vitest';
import { createCaseContract, updateCaseContract } from '@/lib/domain/cases/schema';
import { createCodeContract, createReleaseContract } from '@/lib/domain/codes/schema';
import {
  assessStudyContract, createStudyContract, getStudyContract, listStudiesContract, type Study,
} from '@/lib/domain/studies/schema';
import { ok, refused } from '@/tests/support/api';
import { signUp, type Person } from '@/tests/support/people';
import { awaitOutcome } from '@/tests/support/study';
import { makeWork, type Work } from '@/tests/support/work';

let engineer: Person;
let work: Work;
const sizes = [8, 16, 32, 64];

/** Errors as a second-order method has them. */
const errorsOf = (n: number) => ({ T: { L2: 0.3 / (n * n), Linf: 0.5 / (n * n) } });
const typedGrids = () => sizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n, errors: errorsOf(n) }));
const planned = () => sizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n }));

beforeAll(async () => {
  engineer = await signUp('Studies');
  work = await makeWork(engineer);
});

function make(grids: object[], more: object = {}): Promise<Study> {
  return ok(engineer, createStudyContract, { body: { case: work.case.slug, release: work.release.version, grids, ...more } });
}

function refuseMaking(grids: object[], more: object = {}) {
  return refused(engineer, createStudyContract, { body: { case: work.case.slug, release: work.release.version, grids, ...more } });
}

describe('POST /api/v1/studies', () => {
  it('collects files for the grids planned, following the case until data arrives', async () => {
    const study = await make(planned());
    expect(study).toMatchObject({
      state: 'collecting', revision: 1, currentRevision: 1, planFrozenAt: null, dimension: 2, refinement: 'space', assessment: null,
      code: { slug: work.code.slug }, release: { version: '1.0.0' }, case: { slug: work.case.slug, kind: 'order', revision: 1 }, createdBy: engineer.email,
    });
    expect(study.grids.map(({ label, state }) => [label, state])).toEqual([['n64', 'expected'], ['n32', 'expected'], ['n16', 'expected'], ['n8', 'expected']]);
  });

  it('assesses at once where the errors of every grid are typed', async () => {
    const study = await make(typedGrids());
    expect(study.state).toBe('assessing');
    expect(study.planFrozenAt).not.toBeNull();
    const { outcome, assessment } = await awaitOutcome(engineer, study.id);
    expect(outcome).toBe('pass');
    expect(assessment.fields.map(({ norm, outcome: of }) => [norm, of])).toEqual([['L2', 'pass'], ['Linf', 'pass']]);
    expect(assessment.fields[0]?.orders[0]?.order).toBeCloseTo(2, 10);
    expect(assessment.inputsSha256).toMatch(/^[0-9a-f]{64}$/);
    const kept = await ok(engineer, getStudyContract, { params: { id: study.id } });
    expect(kept).toMatchObject({ state: 'assessed', assessment });
  });

  it('gives the same hash for the same inputs and another for others', async () => {
    const hashOf = async (grids: object[]) => (await awaitOutcome(engineer, (await make(grids)).id)).assessment.inputsSha256;
    const first = await hashOf(typedGrids());
    expect(await hashOf(typedGrids())).toBe(first);
    expect(await hashOf(typedGrids().slice(1))).not.toBe(first);
  });

  it('judges a quantity by its known value as an error, and without one by its GCI', async () => {
    const made = await ok(engineer, createCaseContract, {
      body: {
        code: work.code.slug, problem: work.problem.slug, name: 'Flux and drag', kind: 'benchmark',
        quantities: [{ name: 'flux', formalOrder: 2, knownValue: 1 }, { name: 'drag', formalOrder: 2, target: 0.01 }],
      },
    });
    const study = await make(sizes.map((n) => ({ label: `n${n}`, cellsPerDirection: n, values: { flux: 1 + 0.4 / (n * n), drag: 3 + 1 / (n * n) } })), { case: made.slug });
    const { outcome, assessment } = await awaitOutcome(engineer, study.id);
    expect(assessment.fields).toMatchObject([{ field: 'flux', norm: 'value', outcome: 'pass' }]);
    expect(assessment.quantities).toMatchObject([{ name: 'drag', outcome: 'meets-target' }]);
    expect(outcome).toBe('pass');
  });

  it('takes the time step for the spacing of a study refined in time', async () => {
    const study = await make([0.1, 0.05, 0.025, 0.0125].map((dt, index) => ({
      label: `dt${index}`, dt, errors: { T: { L2: dt * dt, Linf: 2 * dt * dt } },
    })), { refinement: 'time' });
    expect(study.grids.map(({ label }) => label)).toEqual(['dt3', 'dt2', 'dt1', 'dt0']);
    expect((await awaitOutcome(engineer, study.id)).assessment.fields[0]?.grids.map(({ h }) => h)).toEqual([0.0125, 0.025, 0.05, 0.1]);
  });

  it.each([
    ['a typed grid without a spacing', [{ label: 'n8', errors: errorsOf(8) }], 'grids.0.h'],
    ['a field the case does not declare', [{ label: 'n8', h: 0.1, errors: { u: { L2: 1 } } }], 'grids.0.errors.u'],
    ['a norm the case does not declare', [{ label: 'n8', h: 0.1, errors: { T: { L1: 1 } } }], 'grids.0.errors.T.L1'],
    ['a quantity the case does not declare', [{ label: 'n8', h: 0.1, values: { lift: 1 } }], 'grids.0.values.lift'],
    ['two grids of one label', [{ label: 'n8', h: 0.1 }, { label: 'n8', h: 0.2 }], 'grids.1.label'],
    ['two grids of one spacing', [{ label: 'a', h: 0.1 }, { label: 'b', h: 0.1 }], 'grids.1'],
    ['three counts in two dimensions', [{ label: 'n8', cellsPerDirection: [8, 8, 8] }], 'grids.0.cellsPerDirection'],
  ])('refuses %s and names it', async (_what, grids, path) => {
    const problem = await refuseMaking(grids);
    expect(problem.status).toBe(422);
    expect(problem.errors.map((error) => error.path)).toContain(path);
  });

  it('fits a matrix refined in space and time, and gives it no outcome', async () => {
    const steps = [0.1, 0.05, 0.025];
    const grids = [8, 16, 32].flatMap((n) => steps.map((dt) => ({ label: `n${n}-dt${dt}`, cellsPerDirection: n, dt, errors: { T: { L2: 3 / n ** 2 + 0.2 * dt, Linf: 6 / n ** 2 + 0.4 * dt } } })));
    const { outcome, assessment } = await awaitOutcome(engineer, (await make(grids, { refinement: 'space-time' })).id);
    expect(outcome).toBeNull();
    const [first] = assessment.spaceTime ?? [];
    expect(first).toMatchObject({ field: 'T', norm: 'L2', p: expect.closeTo(2, 3) as number, q: expect.closeTo(1, 3) as number, rho: expect.closeTo(1, 3) as number });
    expect(first?.points).toHaveLength(9);
    expect(await refuseMaking(grids.slice(0, 8), { refinement: 'space-time' })).toMatchObject({ status: 422, errors: [{ path: 'grids' }] });
    expect(await refuseMaking(grids.map((grid) => ({ ...grid, dt: undefined })), { refinement: 'space-time' })).toMatchObject({ status: 422, errors: expect.arrayContaining([expect.objectContaining({ path: 'grids.0.dt' })]) as unknown[] });
  });

  it('answers 404 for a case or release that is not there, or another code’s', async () => {
    expect((await refused(engineer, createStudyContract, { body: { case: 'nothing', release: '1.0.0', grids: planned() } })).status).toBe(404);
    expect((await refuseMaking(planned(), { release: '9.9' })).status).toBe(404);
    const other = await makeOther();
    expect((await refuseMaking(planned(), { release: other.release.id })).status).toBe(404);
  });

  it('follows a case and problem changed before data, and no longer after', async () => {
    const study = await make(planned());
    const fields = [{ field: 'T', norms: [{ norm: 'L2' as const, formalOrder: 1 }, { norm: 'Linf' as const, formalOrder: 2 }] }];
    const changed = await ok(engineer, updateCaseContract, { params: { case: work.case.slug }, body: { fields }, headers: { 'if-match': `"${work.case.revision}"` } });
    const followed = await ok(engineer, getStudyContract, { params: { id: study.id } });
    expect(followed.case).toMatchObject({ revision: changed.revision, currentRevision: changed.revision });
    expect(followed.definition.fields[0]?.norms[0]?.formalOrder).toBe(1);
    const before = await make(typedGrids());
    const again = await ok(engineer, updateCaseContract, {
      params: { case: work.case.slug }, body: { fields: [{ field: 'T', norms: [{ norm: 'L2', formalOrder: 2 }, { norm: 'Linf', formalOrder: 2 }] }] },
      headers: { 'if-match': `"${changed.revision}"` },
    });
    work = { ...work, case: again };
    const kept = await ok(engineer, getStudyContract, { params: { id: before.id } });
    expect(kept.case).toMatchObject({ revision: changed.revision, currentRevision: again.revision });
  });
});

async function makeOther(): Promise<Work> {
  const code = await ok(engineer, createCodeContract, { body: { name: 'Another code' } });
  const release = await ok(engineer, createReleaseContract, { params: { code: code.slug }, body: { version: '2.0.0' } });
  return { ...work, code, release };
}

describe('GET /api/v1/studies', () => {
  it('lists the newest first with outcomes, filtered by case, release and state', async () => {
    const study = await make(typedGrids());
    await awaitOutcome(engineer, study.id);
    const open = await make(planned());
    const all = await ok(engineer, listStudiesContract, { query: { limit: 2 } });
    expect(all.items.map(({ id }) => id)).toEqual([open.id, study.id]);
    expect(all.items[1]).toMatchObject({ state: 'assessed', outcome: 'pass' });
    const next = await ok(engineer, listStudiesContract, { query: { limit: 2, cursor: all.nextCursor ?? '' } });
    expect(next.items[0]?.id).not.toBe(study.id);
    const assessed = await ok(engineer, listStudiesContract, { query: { case: work.case.slug, release: '1.0.0', state: 'assessed' } });
    expect(assessed.items.every(({ state }) => state === 'assessed')).toBe(true);
    expect((await ok(engineer, listStudiesContract, { query: { case: 'nothing' } })).items).toEqual([]);
  });
});

describe('GET /api/v1/studies/{id}', () => {
  it('answers 404 for no id, an unknown one and a revision that is not there', async () => {
    const study = await make(planned());
    expect((await refused(engineer, getStudyContract, { params: { id: 'study' } })).status).toBe(404);
    expect((await refused(engineer, getStudyContract, { params: { id: work.code.id } })).status).toBe(404);
    expect((await refused(engineer, getStudyContract, { params: { id: study.id }, query: { revision: 2 } })).status).toBe(404);
  });

  it('answers 404 for another organisation’s study', async () => {
    const study = await make(planned());
    const stranger = await signUp('Strangers');
    expect((await refused(stranger, getStudyContract, { params: { id: study.id } })).status).toBe(404);
  });
});

describe('POST /api/v1/studies/{id}/assess', () => {
  it('says which grids are still open', async () => {
    const study = await make(planned());
    const problem = await refused(engineer, assessStudyContract, { params: { id: study.id } });
    expect(problem).toMatchObject({ status: 409 });
    expect(problem.errors.map(({ path }) => path).sort()).toEqual(['grids.n16', 'grids.n32', 'grids.n64', 'grids.n8']);
  });

  it('refuses what is assessed: that never changes', async () => {
    const study = await make(typedGrids());
    await awaitOutcome(engineer, study.id);
    expect((await refused(engineer, assessStudyContract, { params: { id: study.id } })).status).toBe(409);
  });
});
