import { sql, type Kysely } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table organisations (
      id uuid not null constraint organisations_pkey primary key,
      slug text not null constraint organisations_slug_key unique,
      name text not null,
      created_at timestamptz not null default now()
    );
    create table users (
      id text not null constraint users_pkey primary key,
      email text not null constraint users_email_key unique,
      password_hash text not null,
      created_at timestamptz not null default now()
    );
    create table sessions (
      id text not null constraint sessions_pkey primary key,
      user_id text not null constraint sessions_user_fkey references users (id) on delete cascade,
      expires_at timestamptz not null
    );
    create index sessions_user_idx on sessions (user_id);
    create table memberships (
      organisation_id uuid not null constraint memberships_organisation_fkey references organisations (id),
      user_id text not null constraint memberships_user_fkey references users (id),
      roles text[] not null constraint memberships_roles_check
        check (cardinality(roles) > 0 and roles <@ array['owner', 'engineer', 'reviewer', 'auditor']
          and (not 'auditor' = any (roles) or cardinality(roles) = 1)),
      created_at timestamptz not null default now(),
      constraint memberships_pkey primary key (organisation_id, user_id)
    );
    create index memberships_user_idx on memberships (user_id);
  `.execute(db);
}
