import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { adminDatabase } from '../support/admin-database';
import { applicationClient } from '../support/application-database';
import { makeToken, signUp, type Person } from '../support/people';
import { makeWork, type Work } from '../support/work';

/** Held apart by other means: they carry no content of an organisation. */
const withoutPolicy = ['kysely_migration', 'kysely_migration_lock', 'mail_preferences', 'outbox', 'password_resets', 'sessions', 'users'];

const application = applicationClient();
let own: Person;
let other: Person;
let tables: { name: string; organisation: string }[];

async function insertStudy(person: Person, work: Work): Promise<void> {
  const [study, grid, upload] = [randomUUID(), randomUUID(), randomUUID()];
  const [at, by] = [person.at.id, person.userId];
  const run = (text: string, values: unknown[]) => adminDatabase().query(text, values);
  await run("insert into studies (organisation_id, id, case_id, release_id, refinement, dimension, created_by) values ($1, $2, $3, $4, 'space', 2, $5)",
    [at, study, work.case.id, work.release.id, by]);
  await run(`insert into study_revisions (organisation_id, study_id, revision, case_id, case_revision, problem_id, problem_revision, rule_revision, state, created_by)
    values ($1, $2, 1, $3, 1, $4, 1, 1, 'abandoned', $5)`, [at, study, work.case.id, work.problem.id, by]);
  await run("insert into grids (organisation_id, id, study_id, study_revision, label, definition) values ($1, $2, $3, 1, 'n8', '{}')", [at, grid, study]);
  await run("insert into uploads (organisation_id, id, grid_id, filename, bytes, storage_key, created_by) values ($1, $2, $3, 'a.csv', 1, $4, $5)",
    [at, upload, grid, `trial/${upload}`, by]);
  await run("insert into grid_results (organisation_id, grid_id, upload_id, mapping, norms, numerics_version) values ($1, $2, $3, '{}', '{}', '1')", [at, grid, upload]);
  await run("insert into grid_maps (organisation_id, grid_id, field, plane, width, height, bounds, largest, shares) values ($1, $2, 'T', 'x', 1, 1, '{}', 1, '\\x0000803f')", [at, grid]);
  await run("insert into assessments (organisation_id, id, study_id, study_revision, body, inputs_sha256, numerics_version) values ($1, $2, $3, 1, '{}', '', '1')",
    [at, randomUUID(), study]);
  await run("insert into rechecks (organisation_id, id, study_id, study_revision, numerics_version, requested_by) values ($1, $2, $3, 1, '1', $4)",
    [at, randomUUID(), study, by]);
  await run("insert into invitations (organisation_id, id, email, roles, expires_at, invited_by) values ($1, $2, 'guest@northmoor.example', '{engineer}', now(), $3)",
    [at, randomUUID(), by]);
  await run('insert into auditor_grants (organisation_id, user_id, code_id) values ($1, $2, $3)', [at, by, work.code.id]);
  await run("insert into mails (id, organisation_id, address, kind, facts, state) values ($1, $2, 'guest@northmoor.example', 'invitation', '{}', 'cancelled')", [randomUUID(), at]);
  await run("insert into idempotency_keys (organisation_id, actor_id, key, request_sha256) values ($1, $2, 'trial', '')", [at, by]);
}

/** As the application's role in an organisation; whatever was done is undone. */
async function within<T>(organisation: string, work: () => Promise<T>): Promise<T> {
  await application.query('begin');
  try {
    await application.query("select set_config('app.organisation_id', $1, true)", [organisation]);
    return await work();
  } finally {
    await application.query('rollback');
  }
}

beforeAll(async () => {
  await application.connect();
  [own, other] = [await signUp('Own Works'), await signUp('Other Works')];
  for (const person of [own, other]) {
    await makeToken(person, { scopes: ['read'] });
    await insertStudy(person, await makeWork(person));
  }
  const { rows } = await adminDatabase().query<{ name: string; secured: boolean }>(
    "select relname as name, relrowsecurity and relforcerowsecurity as secured from pg_class where relnamespace = 'public'::regnamespace and relkind = 'r' order by relname",
  );
  expect(rows.filter((row) => !row.secured).map((row) => row.name)).toEqual(withoutPolicy);
  tables = rows.filter((row) => row.secured).map(({ name }) => ({ name, organisation: name === 'organisations' ? 'id' : 'organisation_id' }));
});

afterAll(() => application.end());

describe('as the application’s role in one organisation', () => {
  it('no table shows a row of another, without any where clause', async () => {
    expect(tables.length).toBeGreaterThanOrEqual(16);
    for (const { name, organisation } of tables) {
      const present = await adminDatabase().query(`select 1 from ${name} where ${organisation} = $1`, [other.at.id]);
      expect(present.rowCount, `${name} holds rows of the other organisation`).toBeGreaterThan(0);
      const { rows } = await within(own.at.id, () => application.query<Record<string, unknown>>(`select * from ${name}`));
      expect(rows.length, `${name} shows own rows`).toBeGreaterThan(0);
      expect([...new Set(rows.map((row) => row[organisation]))], name).toEqual([own.at.id]);
    }
  });

  it('no table takes a row for another', async () => {
    for (const { name, organisation } of tables) {
      const { rows: [row] } = await adminDatabase().query<{ row: unknown }>(`select to_jsonb(t) as row from ${name} t where ${organisation} = $1 limit 1`, [other.at.id]);
      const insert = () => application.query(`insert into ${name} select * from jsonb_populate_record(null::${name}, $1)`, [JSON.stringify(row?.row)]);
      await expect(within(own.at.id, insert), name).rejects.toThrow(/row-level security/);
    }
  });

  it('no row of another is changed or deleted by a statement over all rows', async () => {
    for (const { name, organisation } of tables) {
      const { rows: [granted] } = await adminDatabase().query<{ may: boolean }>("select has_table_privilege('fourfold_app', $1, 'update') as may", [name]);
      const statement = `update ${name} set ${organisation} = ${organisation} returning ${organisation} as at`;
      if (!granted?.may) {
        await expect(within(own.at.id, () => application.query(statement)), name).rejects.toThrow(/permission denied/);
        continue;
      }
      const { rows } = await within(own.at.id, () => application.query<{ at: string }>(statement));
      expect([...new Set(rows.map((row) => row.at))], name).toEqual([own.at.id]);
    }
  });

  it('shows nothing where no organisation is set', async () => {
    for (const { name, organisation } of tables) {
      // Mails about an account belong to no organisation.
      expect((await application.query(`select * from ${name} where ${organisation} is not null`)).rows, name).toEqual([]);
    }
  });

  it('shows no token by a guess at the table, only by its hash through the function', async () => {
    expect((await application.query('select * from find_api_token($1)', [Buffer.alloc(32)])).rows).toEqual([]);
  });
});
