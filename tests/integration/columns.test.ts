import { randomUUID } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { getCaseContract, putColumnsContract } from '@/lib/domain/cases/schema';
import { adminDatabase } from '../support/admin-database';
import { ok, refused } from '../support/api';
import { signUp, type Person } from '../support/people';
import { makeWork, type Work } from '../support/work';

let person: Person;
let work: Work;
beforeAll(async () => {
  person = await signUp('Column Works');
  work = await makeWork(person);
});

const mapping = { x: 'X', y: 'Y', weight: 'vol', fields: { T: 'temperature' } };

/** A study with one grid in the state given, as it lies in the database. */
async function insertGrid(state: string, studyState = 'collecting'): Promise<string> {
  const [study, grid, organisation] = [randomUUID(), randomUUID(), person.at.id];
  const database = adminDatabase();
  await database.query(
    'insert into studies (organisation_id, id, case_id, release_id, refinement, dimension, created_by) values ($1, $2, $3, $4, $5, 2, $6)',
    [organisation, study, work.case.id, work.release.id, 'space', person.userId],
  );
  await database.query(
    `insert into study_revisions (organisation_id, study_id, revision, case_id, case_revision, problem_id, problem_revision, rule_revision, state, created_by)
     values ($1, $2, 1, $3, 1, $4, 1, 1, $5, $6)`,
    [organisation, study, work.case.id, work.problem.id, studyState, person.userId],
  );
  await database.query(
    `insert into grids (organisation_id, id, study_id, study_revision, label, definition, state) values ($1, $2, $3, 1, 'n8', '{"label":"n8","h":0.125}', $4)`,
    [organisation, grid, study, state],
  );
  return grid;
}

async function jobsOf(grid: string): Promise<string[]> {
  const { rows } = await adminDatabase().query<{ job: string }>('select job from outbox where subject_id = $1', [grid]);
  return rows.map((row) => row.job);
}

describe('PUT /api/v1/cases/{case}/columns', () => {
  it('keeps the mapping outside of the revisions', async () => {
    const changed = await ok(person, putColumnsContract, { params: { case: work.case.slug }, body: mapping });
    expect(changed).toMatchObject({ columns: mapping, revision: 1 });
    expect(await ok(person, getCaseContract, { params: { case: work.case.slug } })).toEqual(changed);
  });

  it('queues the reading of grids that wait for it or were rejected under the old one, and of no others', async () => {
    const [waiting, rejected, read, past] = [
      await insertGrid('needs-columns'), await insertGrid('rejected'), await insertGrid('read'), await insertGrid('needs-columns', 'abandoned'),
    ];
    await ok(person, putColumnsContract, { params: { case: work.case.id }, body: { ...mapping, weight: null } });
    expect(await Promise.all([waiting, rejected, read, past].map(jobsOf))).toEqual([['grid.read'], ['grid.read'], [], []]);
    const { rows } = await adminDatabase().query<{ state: string }>('select state from grids where id = any ($1) order by state', [[read, past]]);
    expect(rows.map((row) => row.state)).toEqual(['needs-columns', 'read']);
  });

  it.each([
    ['no column of y in two dimensions', { x: 'X', weight: null, fields: {} }, 'y'],
    ['a column of z in two dimensions', { ...mapping, z: 'Z' }, 'z'],
    ['a time in a steady problem', { ...mapping, t: 'time' }, 't'],
    ['a field the case does not declare', { ...mapping, fields: { U: 'u' } }, 'fields.U'],
    ['nothing said about weights', { x: 'X', y: 'Y', fields: {} }, 'weight'],
  ])('answers 422 naming the member for %s', async (_what, body, path) => {
    expect(await refused(person, putColumnsContract, { params: { case: work.case.slug }, body })).toMatchObject({ status: 422, errors: [{ path }] });
  });

  it('answers 404 for another organisation’s case', async () => {
    const stranger = await signUp('Stranger Works');
    expect((await refused(stranger, putColumnsContract, { params: { case: work.case.id }, body: mapping })).status).toBe(404);
  });
});
