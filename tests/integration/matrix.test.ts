import { beforeAll, describe, expect, it } from 'vitest';
import { createCaseContract } from '@/lib/domain/cases/schema';
import { createCodeContract, createReleaseContract, updateReleaseContract } from '@/lib/domain/codes/schema';
import { getMatrixContract } from '@/lib/domain/matrix/schema';
import { createStudyContract, getOutcomeContract } from '@/lib/domain/studies/schema';
import { ifMatch, ok, refused } from '../support/api';
import { makeToken, signUp, type Person } from '../support/people';
import { makeWork, orderCase, type Work } from '../support/work';

let person: Person;
let work: Work;
beforeAll(async () => {
  person = await signUp('Matrix Works');
  work = await makeWork(person);
  await ok(person, createReleaseContract, { params: { code: work.code.slug }, body: { version: '1.1.0' } });
});

/** A study of typed errors that fall with the order given, assessed. */
async function assess(release: string, order: number, factor = 1): Promise<string> {
  const grids = [8, 16, 32, 64].map((n) => ({ label: `n${n}`, h: 1 / n, errors: { T: { L2: factor * n ** -order, Linf: 2 * factor * n ** -order } } }));
  const study = await ok(person, createStudyContract, { body: { case: work.case.slug, release, grids } });
  await ok(person, getOutcomeContract, { params: { id: study.id }, query: { wait: 60 } });
  return study.id;
}

describe('GET /api/v1/codes/{code}/matrix', () => {
  const matrixOf = () => ok(person, getMatrixContract, { params: { code: work.code.slug } });

  it('shows what was not run, and releases oldest first', async () => {
    const matrix = await matrixOf();
    expect(matrix.code).toEqual({ id: work.code.id, slug: work.code.slug, name: work.code.name });
    expect(matrix.releases).toMatchObject([
      { version: '1.0.0', standing: 'incomplete', counts: { notRun: 1 } }, { version: '1.1.0', standing: 'incomplete', counts: { notRun: 1 } },
    ]);
    expect(matrix.cases).toMatchObject([{ slug: work.case.slug, formalOrder: 2, target: null, trend: [], cells: [{ state: 'not-run' }, { state: 'not-run' }] }]);
  });

  it('shows outcome, lowest order, standing, trend and what got worse', async () => {
    const [before, after] = [await assess('1.0.0', 2), await assess('1.1.0', 1)];
    const matrix = await matrixOf();
    expect(matrix.releases.map((release) => release.standing)).toEqual(['stands', 'does-not-stand']);
    const [row] = matrix.cases;
    expect(row?.cells).toMatchObject([
      { study: before, state: 'assessed', outcome: 'pass', exact: false, gridsRead: 4, gridsPlanned: 4, lowest: { field: 'T', formalOrder: 2 } },
      { study: after, state: 'assessed', outcome: 'fail', lowest: { field: 'T', formalOrder: 2 } },
    ]);
    expect(row?.cells[0]?.lowest?.observed).toBeCloseTo(2, 9);
    expect(row?.cells[1]?.lowest?.observed).toBeCloseTo(1, 9);
    expect(row?.trend).toEqual([{ release: '1.0.0', error: 64 ** -2 }, { release: '1.1.0', error: 1 / 64 }]);
    expect(matrix.worse).toMatchObject([{ case: work.case.slug, field: 'T', before: '1.0.0', after: '1.1.0', h: 1 / 64 }]);
    expect(matrix.worse[0]?.ratio).toBeCloseTo(64, 9);
  });

  it('takes the latest study of a case and release', async () => {
    const latest = await assess('1.1.0', 2);
    const matrix = await matrixOf();
    expect(matrix.cases[0]?.cells[1]).toMatchObject({ study: latest, outcome: 'pass' });
    expect(matrix.worse).toEqual([]);
  });

  it('shows a study that still collects as in progress', async () => {
    await ok(person, createCaseContract, { body: { ...orderCase, name: 'Collecting', slug: 'collecting', code: work.code.slug, problem: work.problem.slug } });
    const grids = [8, 16].map((n) => ({ label: `n${n}`, h: 1 / n }));
    await ok(person, createStudyContract, { body: { case: 'collecting', release: '1.1.0', grids } });
    const matrix = await matrixOf();
    expect(matrix.cases[1]?.cells[1]).toMatchObject({ state: 'collecting', outcome: null, gridsRead: 0, gridsPlanned: 2 });
    expect(matrix.releases[1]).toMatchObject({ standing: 'incomplete', counts: { inProgress: 1, passOrExact: 1 } });
  });

  it('says withdrawn of a withdrawn release', async () => {
    const params = { code: work.code.slug, version: '1.0.0' };
    await ok(person, updateReleaseContract, { params, body: { state: 'withdrawn' }, ...ifMatch(1) });
    expect((await matrixOf()).releases[0]?.standing).toBe('withdrawn');
  });

  it('answers 404 for another organisation’s code and to a token of another code', async () => {
    const stranger = await signUp('Stranger Works');
    expect((await refused(stranger, getMatrixContract, { params: { code: work.code.id } })).status).toBe(404);
    const other = await ok(person, createCodeContract, { body: { name: 'Weir' } });
    const token = await makeToken(person, { scopes: ['read'], code: other.slug });
    expect((await refused(token, getMatrixContract, { params: { code: work.code.slug } })).status).toBe(404);
    await ok(token, getMatrixContract, { params: { code: other.slug } });
  });
});
