import { beforeAll, describe, expect, it } from 'vitest';
import { createCaseContract } from '@/lib/domain/cases/schema';
import { createCodeContract } from '@/lib/domain/codes/schema';
import { createProblemContract, getProblemContract, listProblemsContract, updateProblemContract } from '@/lib/domain/problems/schema';
import { ifMatch, ok, refused } from '../support/api';
import { signUp, type Person } from '../support/people';
import { heatProblem, makeWork, orderCase } from '../support/work';

let person: Person;
beforeAll(async () => {
  person = await signUp('Problem Works');
});

describe('POST /api/v1/problems', () => {
  it('answers with what its GET gives, defaults filled in', async () => {
    const made = await ok(person, createProblemContract, { body: { ...heatProblem, slug: 'heat-square' } });
    expect(made).toMatchObject({ ...heatProblem, slug: 'heat-square', revision: 1, unsteady: false, usedBy: [] });
    expect(await ok(person, getProblemContract, { params: { problem: 'heat-square' } })).toEqual(made);
    expect(await ok(person, getProblemContract, { params: { problem: made.id } })).toEqual(made);
  });

  it('takes a problem without exact solution, and constants that vary in space', async () => {
    await ok(person, createProblemContract, { body: { name: 'Typed only', equation: 'none', dimension: 3 } });
    const varying = { constants: { k: '1 + a*x/2', a: 2 }, exact: { T: 'exp(-t)*erf(k*x)' }, unsteady: true };
    await ok(person, createProblemContract, { body: { ...heatProblem, name: 'Varying', ...varying } });
  });

  it.each([
    ['an unknown name', { exact: { T: 'sin(pi*x) + q*y' } }, 'exact.T', /^Character 13: .*“q”/],
    ['a product without its sign', { exact: { T: '2x' } }, 'exact.T', /^Character 2: /],
    ['a coordinate beyond the dimension', { exact: { T: 'x*z' } }, 'exact.T', /^Character 3: z is not a coordinate/],
    ['time in a steady problem', { exact: { T: 'x*t' } }, 'exact.T', /^Character 3: t is not a coordinate/],
    ['a kink', { exact: { T: 'abs(x)' } }, 'exact.T', /not smooth/],
    ['a constant with an error', { constants: { k: '1 +' } }, 'constants.k', /^Character /],
    ['a constant named as a function', { constants: { k: 1, sin: 2 } }, 'constants.sin', /meaning of its own/],
    ['a field named as a coordinate', { exact: { y: 'x' } }, 'exact.y', /meaning of its own/],
    ['a field named as a constant', { exact: { k: 'x' } }, 'constants.k', /field and a constant/],
    ['a range upside down', { domain: { x: [1, 0] } }, 'domain.x', /first below the second/],
    ['a range of a coordinate that is not there', { domain: { z: [0, 1] } }, 'domain.z', /dimension 2 has x, y/],
  ])('answers 422 naming member and character for %s', async (_what, changes, path, message) => {
    const problem = await refused(person, createProblemContract, { body: { ...heatProblem, name: 'Wrong', ...changes } });
    expect(problem.status).toBe(422);
    expect(problem.errors.find((error) => error.path === path)?.message).toMatch(message);
  });

  it.each([['equation', { equation: 'custom' }], ['residual', { residual: { T: 'd(T, x)' } }]])('answers 422 not available for %s', async (path, changes) => {
    const problem = await refused(person, createProblemContract, { body: { ...heatProblem, name: 'Later', ...changes } });
    expect(problem).toMatchObject({ status: 422, title: 'Not available yet', errors: [{ path }] });
  });

  it('answers 409 naming the slug when it is taken', async () => {
    const body = { ...heatProblem, slug: 'taken' };
    await ok(person, createProblemContract, { body });
    expect(await refused(person, createProblemContract, { body })).toMatchObject({ status: 409, errors: [{ path: 'slug' }] });
  });
});

describe('GET /api/v1/problems', () => {
  it('lists the newest first with the cases on each', async () => {
    const own = await signUp('Listing Works');
    const work = await makeWork(own);
    await ok(own, createProblemContract, { body: { ...heatProblem, name: 'Unused' } });
    const { items } = await ok(own, listProblemsContract, {});
    expect(items.map((item) => [item.name, item.usedBy])).toEqual([
      ['Unused', []], [heatProblem.name, [{ id: work.case.id, slug: work.case.slug, name: work.case.name }]],
    ]);
  });
});

describe('GET /api/v1/problems/{problem}', () => {
  it('answers 404 for another organisation’s problem', async () => {
    const { problem } = await makeWork(await signUp('Stranger Works'));
    expect((await refused(person, getProblemContract, { params: { problem: problem.id } })).status).toBe(404);
  });
});

describe('PATCH /api/v1/problems/{problem}', () => {
  it('makes a revision in which the members given replace those before', async () => {
    const made = await ok(person, createProblemContract, { body: { ...heatProblem, name: 'Changing' } });
    const changed = await ok(person, updateProblemContract, { params: { problem: made.slug }, body: { constants: { k: 2 }, name: 'Changed' }, ...ifMatch(1) });
    expect(changed).toMatchObject({ ...heatProblem, id: made.id, slug: made.slug, name: 'Changed', constants: { k: 2 }, revision: 2 });
    expect(changed.changedAt > made.createdAt).toBe(true);
    expect(await ok(person, getProblemContract, { params: { problem: made.slug } })).toEqual(changed);
  });

  it('answers 412 to a stale revision and 422 to a change that does not compile', async () => {
    const made = await ok(person, createProblemContract, { body: { ...heatProblem, name: 'Raced' } });
    const params = { problem: made.id };
    await ok(person, updateProblemContract, { params, body: { form: 'divergence' }, ...ifMatch(1) });
    expect((await refused(person, updateProblemContract, { params, body: { form: 'advective' }, ...ifMatch(1) })).status).toBe(412);
    expect((await refused(person, updateProblemContract, { params, body: { constants: {} }, ...ifMatch(2) })).status).toBe(422);
  });

  it('answers 409 to a change that takes away the field a case is judged by', async () => {
    const code = await ok(person, createCodeContract, { body: { name: 'Stranded' } });
    const made = await ok(person, createProblemContract, { body: { ...heatProblem, name: 'Needed' } });
    await ok(person, createCaseContract, { body: { ...orderCase, name: 'Needs T', code: code.id, problem: made.id } });
    const problem = await refused(person, updateProblemContract, { params: { problem: made.id }, body: { exact: { S: 'x' } }, ...ifMatch(1) });
    expect(problem.status).toBe(409);
    expect(problem.detail).toContain('Needs T');
  });
});
