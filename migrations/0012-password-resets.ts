import { sql, type Kysely } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table password_resets (
      id uuid not null constraint password_resets_pkey primary key,
      user_id text not null constraint password_resets_user_fkey references users (id) on delete cascade,
      -- Known from the sending on.
      token_sha256 bytea constraint password_resets_token_key unique,
      expires_at timestamptz not null,
      used_at timestamptz,
      created_at timestamptz not null default now()
    );
    create index password_resets_user_idx on password_resets (user_id);
    grant select, insert, update, delete on password_resets to fourfold_app;
    grant select on password_resets to fourfold_maintenance;
  `.execute(db);
}
