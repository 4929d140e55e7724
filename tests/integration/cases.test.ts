import { beforeAll, describe, expect, it } from 'vitest';
import { createCaseContract, getCaseContract, listCasesContract, updateCaseContract } from '@/lib/domain/cases/schema';
import { createCodeContract } from '@/lib/domain/codes/schema';
import { createProblemContract } from '@/lib/domain/problems/schema';
import { ifMatch, ok, refused } from '../support/api';
import { makeToken, signUp, type Person } from '../support/people';
import { heatProblem, makeWork, orderCase, type Work } from '../support/work';

let person: Person;
let work: Work;
beforeAll(async () => {
  person = await signUp('Case Works');
  work = await makeWork(person);
});

const caseOf = (changes: object) => ({ ...orderCase, code: work.code.slug, problem: work.problem.slug, name: 'Tried', ...changes });
const norm = (changes: object) => ({ fields: [{ field: 'T', norms: [{ norm: 'L2', formalOrder: 2, ...changes }] }] });

describe('POST /api/v1/cases', () => {
  it('answers with what its GET gives, defaults filled in', async () => {
    const made = await ok(person, createCaseContract, { body: caseOf({ slug: 'full', options: { flux: 'central' }, requirements: ['SRS-12'], minimumGrids: 5 }) });
    expect(made).toMatchObject({
      slug: 'full', kind: 'order', revision: 1, columns: null, minimumGrids: 5, options: { flux: 'central' },
      code: { slug: work.code.slug, name: 'Brack' }, problem: { slug: work.problem.slug, name: heatProblem.name },
      fields: [{ field: 'T', datum: 'none', norms: [{ norm: 'L2', formalOrder: 2, counts: true, expectExact: false }, { norm: 'Linf' }] }],
    });
    expect(await ok(person, getCaseContract, { params: { case: 'full' } })).toEqual(made);
    expect(await ok(person, getCaseContract, { params: { case: made.id } })).toEqual(made);
  });

  it('takes typed errors of any field where the problem has no exact solution', async () => {
    const problem = await ok(person, createProblemContract, { body: { name: 'Typed', equation: 'none', dimension: 1 } });
    await ok(person, createCaseContract, { body: caseOf({ problem: problem.slug, name: 'Typed', fields: norm({}).fields.map((field) => ({ ...field, field: 'S' })) }) });
  });

  it.each([
    ['a rigid motion of one component', { fields: [{ field: 'T', datum: 'rigid', norms: [{ norm: 'L2' }] }] }, 'fields.0.datum'],
    ['a field the exact solution has not', { fields: [{ field: 'U', norms: [{ norm: 'L2' }] }] }, 'fields.0.field'],
    ['a field twice', { fields: [...norm({}).fields, ...norm({}).fields] }, 'fields.1.field'],
    ['a norm twice', { fields: [{ field: 'T', norms: [{ norm: 'L2' }, { norm: 'L2' }] }] }, 'fields.0.norms.1.norm'],
    ['L1 counting alone', { fields: [{ field: 'T', norms: [{ norm: 'L1', formalOrder: 2 }, { norm: 'L2', formalOrder: 2, counts: false }] }] }, 'fields.0.norms.0.counts'],
    ['a tolerance looser than the rule', norm({ tolerance: 0.11 }), 'fields.0.norms.0.tolerance'],
    ['a tolerance without an order', { fields: [{ field: 'T', norms: [{ norm: 'L2', tolerance: 0.1 }] }] }, 'fields.0.norms.0.tolerance'],
    ['a derived order below the formal one', norm({ derivedOrder: 1 }), 'fields.0.norms.0.derivedOrder'],
    ['nothing to observe', { fields: [] }, 'fields'],
    ['an exactness case that expects nothing exact', { kind: 'exactness' }, 'fields.0.norms.0.expectExact'],
    ['a benchmark without a known value', { kind: 'benchmark', quantities: [{ name: 'drag' }] }, 'quantities'],
    ['a solution case without a quantity', { kind: 'solution', fields: [] }, 'quantities'],
    ['a solution case with a known value', { kind: 'solution', fields: [], quantities: [{ name: 'drag', knownValue: 1 }] }, 'quantities.0.knownValue'],
    ['a quantity twice', { quantities: [{ name: 'drag' }, { name: 'drag' }] }, 'quantities.1.name'],
    ['a grid planned twice', { gridPlan: [{ label: 'a' }, { label: 'a' }] }, 'gridPlan.1.label'],
    ['fewer than three grids', { minimumGrids: 2 }, 'minimumGrids'],
    ['a column for a field it has not', { columns: { x: 'x', y: 'y', weight: null, fields: { U: 'u' } } }, 'columns.fields.U'],
  ])('answers 422 naming the member for %s', async (_what, changes, path) => {
    const problem = await refused(person, createCaseContract, { body: caseOf(changes) });
    expect(problem.status).toBe(422);
    expect(problem.errors.map((error) => error.path)).toContain(path);
  });

  it.each([
    ['fields.0.norms.0.backing.scheme', norm({ backing: { scheme: 'central-2' } })],
  ])('answers 422 not available for %s', async (path, changes) => {
    expect(await refused(person, createCaseContract, { body: caseOf(changes) })).toMatchObject({ status: 422, title: 'Not available yet', errors: [{ path }] });
  });

  it('answers 404 for another organisation’s code or problem', async () => {
    const theirs = await makeWork(await signUp('Stranger Works'));
    expect((await refused(person, createCaseContract, { body: caseOf({ code: theirs.code.id }) })).status).toBe(404);
    expect((await refused(person, createCaseContract, { body: caseOf({ problem: theirs.problem.id }) })).status).toBe(404);
  });
});

describe('GET /api/v1/cases', () => {
  it('lists by code and by problem, and to a token those of its code only', async () => {
    const own = await signUp('Listing Works');
    const first = await makeWork(own);
    const code = await ok(own, createCodeContract, { body: { name: 'Weir' } });
    const problem = await ok(own, createProblemContract, { body: { ...heatProblem, name: 'Second' } });
    await ok(own, createCaseContract, { body: { ...orderCase, name: 'B', code: code.slug, problem: first.problem.slug } });
    await ok(own, createCaseContract, { body: { ...orderCase, name: 'C', code: code.slug, problem: problem.slug } });
    const names = async (query: Record<string, string>, who: Parameters<typeof ok>[0] = own) => (await ok(who, listCasesContract, { query })).items.map((item) => item.name);
    expect(await names({})).toEqual(['C', 'B', orderCase.name]);
    expect(await names({ code: code.slug })).toEqual(['C', 'B']);
    expect(await names({ problem: first.problem.id })).toEqual(['B', orderCase.name]);
    expect(await names({ code: code.slug, problem: problem.slug })).toEqual(['C']);
    expect(await names({}, await makeToken(own, { scopes: ['read'], code: first.code.slug }))).toEqual([orderCase.name]);
    expect((await refused(own, listCasesContract, { query: { code: 'nothing' } })).status).toBe(404);
  });
});

describe('GET /api/v1/cases/{case}', () => {
  it('answers 404 for another organisation’s case and to a token of another code', async () => {
    const theirs = await makeWork(await signUp('Stranger Works'));
    expect((await refused(person, getCaseContract, { params: { case: theirs.case.id } })).status).toBe(404);
    const code = await ok(person, createCodeContract, { body: { name: 'Apart' } });
    const token = await makeToken(person, { scopes: ['read'], code: code.slug });
    expect((await refused(token, getCaseContract, { params: { case: work.case.slug } })).status).toBe(404);
  });
});

describe('PATCH /api/v1/cases/{case}', () => {
  it('makes a revision in which the members given replace those before', async () => {
    const made = await ok(person, createCaseContract, { body: caseOf({ name: 'Changing' }) });
    const params = { case: made.slug };
    const changed = await ok(person, updateCaseContract, { params, body: { ...norm({ tolerance: 0.05 }), minimumGrids: 3 }, ...ifMatch(1) });
    expect(changed).toMatchObject({ id: made.id, slug: made.slug, name: 'Changing', revision: 2, minimumGrids: 3, gridPlan: made.gridPlan });
    expect(changed.fields[0]?.norms).toMatchObject([{ tolerance: 0.05 }]);
    expect((await refused(person, updateCaseContract, { params, body: { name: 'Late' }, ...ifMatch(1) })).status).toBe(412);
    expect((await refused(person, updateCaseContract, { params, body: { kind: 'benchmark' }, ...ifMatch(2) })).status).toBe(422);
    expect((await refused(person, updateCaseContract, { params, body: { fields: [] }, ...ifMatch(2) })).status).toBe(422);
  });

  it('takes elements with their degree, whose orders need not be stated, and takes them away again', async () => {
    const stated = { sampling: 'quadrature', elements: { degree: 2 }, fields: [{ field: 'T', norms: [{ norm: 'L2', tolerance: 0.1 }] }] } as const;
    const made = await ok(person, createCaseContract, { body: caseOf({ name: 'Elements', ...stated }) });
    expect(made.elements).toEqual({ degree: 2 });
    expect((await refused(person, createCaseContract, { body: caseOf({ name: 'Points', ...stated, elements: { degree: 0 } }) })).status).toBe(422);
    const params = { case: made.slug };
    // The tolerance has no order to stand about then.
    expect((await refused(person, updateCaseContract, { params, body: { elements: null }, ...ifMatch(1) })).errors).toMatchObject([{ path: 'fields.0.norms.0.tolerance' }]);
    const changed = await ok(person, updateCaseContract, { params, body: { elements: null, ...norm({ formalOrder: 2 }) }, ...ifMatch(1) });
    expect(changed.elements).toBeUndefined();
  });
});
