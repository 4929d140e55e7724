import { sql, type Kysely } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    -- A mail about an account belongs to no organisation.
    alter table outbox alter column organisation_id drop not null;

    create table mails (
      id uuid not null constraint mails_pkey primary key,
      organisation_id uuid constraint mails_organisation_fkey references organisations (id),
      user_id text constraint mails_user_fkey references users (id),
      address text not null,
      kind text not null,
      -- What the mail is about: an invitation, a reset, a study.
      subject_id uuid,
      -- What it tells; never a secret.
      facts jsonb not null,
      state text not null default 'queued' constraint mails_state_check check (state in ('queued', 'sending', 'sent', 'failed', 'cancelled')),
      -- How often it was asked for again; with the id it makes the Message-ID.
      resends integer not null default 0,
      fault text,
      created_at timestamptz not null default now(),
      claimed_at timestamptz,
      sent_at timestamptz
    );
    create index mails_organisation_idx on mails (organisation_id, id desc);
    create index mails_subject_idx on mails (subject_id);
    alter table mails enable row level security;
    alter table mails force row level security;
    -- Without an organisation only the mails of none are seen.
    create policy mails_tenant on mails to fourfold_app
      using (organisation_id is not distinct from current_organisation()) with check (organisation_id is not distinct from current_organisation());
    create policy mails_maintenance on mails for select to fourfold_maintenance using (true);

    create table mail_preferences (
      user_id text not null constraint mail_preferences_user_fkey references users (id) on delete cascade,
      kind text not null,
      wanted boolean not null,
      constraint mail_preferences_pkey primary key (user_id, kind)
    );
    grant select, insert, update on mails to fourfold_app;
    grant select, insert, update, delete on mail_preferences to fourfold_app;
    grant select on mails, mail_preferences to fourfold_maintenance;
  `.execute(db);
}
