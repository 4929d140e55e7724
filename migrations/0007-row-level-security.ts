import { sql, type Kysely } from 'kysely';

const tenantTables = [
  'memberships', 'api_tokens', 'codes', 'releases', 'problems', 'problem_revisions', 'cases', 'case_revisions', 'studies', 'study_revisions',
  'grids', 'uploads', 'grid_results', 'assessments', 'idempotency_keys',
];

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create function current_organisation() returns uuid language sql stable
      as $$ select nullif(current_setting('app.organisation_id', true), '')::uuid $$;
    create function current_user_id() returns text language sql stable
      as $$ select nullif(current_setting('app.user_id', true), '') $$;
  `.execute(db);

  for (const table of tenantTables) {
    await sql`
      alter table ${sql.table(table)} enable row level security;
      alter table ${sql.table(table)} force row level security;
      create policy ${sql.id(`${table}_tenant`)} on ${sql.table(table)} to fourfold_app
        using (organisation_id = current_organisation()) with check (organisation_id = current_organisation());
      create policy ${sql.id(`${table}_maintenance`)} on ${sql.table(table)} for select to fourfold_maintenance using (true);
    `.execute(db);
  }

  await sql`
    alter table organisations enable row level security;
    alter table organisations force row level security;
    create policy organisations_tenant on organisations to fourfold_app
      using (id = current_organisation()) with check (id = current_organisation());
    create policy organisations_maintenance on organisations for select to fourfold_maintenance using (true);
    -- Somebody who signs in sees where they belong before an organisation is chosen.
    create policy memberships_own on memberships for select to fourfold_app using (user_id = current_user_id());
    create policy organisations_own on organisations for select to fourfold_app
      using (exists (select 1 from memberships m where m.organisation_id = organisations.id and m.user_id = current_user_id()));
  `.execute(db);

  await sql`
    create policy api_tokens_lookup on api_tokens for select to fourfold_lookup using (true);
    grant usage, create on schema public to fourfold_lookup;
    grant select on api_tokens to fourfold_lookup;
    create function find_api_token(secret bytea)
      returns table (organisation_id uuid, id uuid, user_id text, code_id uuid, name text, scopes text[], expires_at timestamptz)
      language sql stable security definer set search_path = public, pg_temp
      as $$ select t.organisation_id, t.id, t.user_id, t.code_id, t.name, t.scopes, t.expires_at
            from api_tokens t where t.secret_sha256 = secret $$;
    revoke execute on function find_api_token(bytea) from public;
    grant execute on function find_api_token(bytea) to fourfold_app;
    alter function find_api_token(bytea) owner to fourfold_lookup;
    revoke create on schema public from fourfold_lookup;
  `.execute(db);

  await sql`
    grant usage on schema public to fourfold_app, fourfold_maintenance;
    grant select, insert, update, delete on all tables in schema public to fourfold_app;
    revoke update, delete on assessments from fourfold_app;
    revoke all on kysely_migration, kysely_migration_lock from fourfold_app;
    grant select on all tables in schema public to fourfold_maintenance;
  `.execute(db);
}
