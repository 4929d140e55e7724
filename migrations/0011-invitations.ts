import { sql, type Kysely } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    alter table organisations add column revision integer not null default 1;
    -- The end of an auditor's access.
    alter table memberships add column until timestamptz,
      add constraint memberships_until_check check ((until is not null) <= ('auditor' = any (roles)));

    create table invitations (
      organisation_id uuid not null constraint invitations_organisation_fkey references organisations (id),
      id uuid not null,
      email text not null,
      roles text[] not null,
      -- Null: every code.
      code_ids uuid[],
      until timestamptz,
      -- Known from the sending on; sent again, the link before is void.
      token_sha256 bytea constraint invitations_token_key unique,
      state text not null default 'pending' constraint invitations_state_check check (state in ('pending', 'accepted', 'revoked')),
      expires_at timestamptz not null,
      invited_by text not null constraint invitations_invited_by_fkey references users (id),
      accepted_by text constraint invitations_accepted_by_fkey references users (id),
      created_at timestamptz not null default now(),
      constraint invitations_pkey primary key (organisation_id, id)
    );
    create unique index invitations_pending_key on invitations (organisation_id, email) where state = 'pending';

    -- The codes an auditor may see; without a row, every code.
    create table auditor_grants (
      organisation_id uuid not null,
      user_id text not null,
      code_id uuid not null,
      constraint auditor_grants_pkey primary key (organisation_id, user_id, code_id),
      constraint auditor_grants_membership_fkey foreign key (organisation_id, user_id)
        references memberships (organisation_id, user_id) on delete cascade,
      constraint auditor_grants_code_fkey foreign key (organisation_id, code_id) references codes (organisation_id, id)
    );
  `.execute(db);

  for (const table of ['invitations', 'auditor_grants']) {
    await sql`
      alter table ${sql.table(table)} enable row level security;
      alter table ${sql.table(table)} force row level security;
      create policy ${sql.id(`${table}_tenant`)} on ${sql.table(table)} to fourfold_app
        using (organisation_id = current_organisation()) with check (organisation_id = current_organisation());
      create policy ${sql.id(`${table}_maintenance`)} on ${sql.table(table)} for select to fourfold_maintenance using (true);
      grant select, insert, update, delete on ${sql.table(table)} to fourfold_app;
      grant select on ${sql.table(table)} to fourfold_maintenance;
    `.execute(db);
  }

  await sql`
    create policy invitations_lookup on invitations for select to fourfold_lookup using (true);
    grant usage, create on schema public to fourfold_lookup;
    grant select on invitations to fourfold_lookup;
    create function find_invitation(secret bytea) returns table (organisation_id uuid, id uuid)
      language sql stable security definer set search_path = public, pg_temp
      as $$ select i.organisation_id, i.id from invitations i where i.token_sha256 = secret $$;
    revoke execute on function find_invitation(bytea) from public;
    grant execute on function find_invitation(bytea) to fourfold_app;
    alter function find_invitation(bytea) owner to fourfold_lookup;
    revoke create on schema public from fourfold_lookup;
  `.execute(db);
}
