import { sql, type Kysely } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table codes (
      organisation_id uuid not null constraint codes_organisation_fkey references organisations (id),
      id uuid not null,
      slug text not null,
      name text not null,
      created_by text not null constraint codes_created_by_fkey references users (id),
      created_at timestamptz not null default now(),
      constraint codes_pkey primary key (organisation_id, id),
      constraint codes_slug_key unique (organisation_id, slug)
    );
    create table releases (
      organisation_id uuid not null,
      id uuid not null,
      code_id uuid not null,
      version text not null,
      commit text,
      state text not null default 'planned' constraint releases_state_check check (state in ('planned', 'current', 'withdrawn')),
      revision integer not null default 1,
      created_by text not null constraint releases_created_by_fkey references users (id),
      created_at timestamptz not null default now(),
      constraint releases_pkey primary key (organisation_id, id),
      constraint releases_version_key unique (organisation_id, code_id, version),
      constraint releases_code_fkey foreign key (organisation_id, code_id) references codes (organisation_id, id)
    );
    create table api_tokens (
      organisation_id uuid not null constraint api_tokens_organisation_fkey references organisations (id),
      id uuid not null,
      user_id text not null constraint api_tokens_user_fkey references users (id),
      code_id uuid,
      name text not null,
      secret_sha256 bytea not null constraint api_tokens_secret_key unique,
      scopes text[] not null constraint api_tokens_scopes_check check (cardinality(scopes) > 0 and scopes <@ array['read', 'write']),
      expires_at timestamptz,
      last_used_at timestamptz,
      created_at timestamptz not null default now(),
      constraint api_tokens_pkey primary key (organisation_id, id),
      constraint api_tokens_code_fkey foreign key (organisation_id, code_id) references codes (organisation_id, id),
      constraint api_tokens_membership_fkey foreign key (organisation_id, user_id)
        references memberships (organisation_id, user_id) on delete cascade
    );
    create index api_tokens_user_idx on api_tokens (organisation_id, user_id);
  `.execute(db);
}
