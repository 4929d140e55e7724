import { sql, type Kysely } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    -- Ids only, so it needs no policy. A row is done when its handler has ended, not when it is queued.
    create table outbox (
      id uuid not null constraint outbox_pkey primary key,
      organisation_id uuid not null,
      job text not null,
      subject_id uuid not null,
      subject_revision integer,
      attempt integer not null default 0,
      state text not null default 'waiting' constraint outbox_state_check check (state in ('waiting', 'queued', 'done', 'failed')),
      due_at timestamptz not null default now(),
      queued_at timestamptz,
      done_at timestamptz,
      last_error text,
      created_at timestamptz not null default now()
    );
    create index outbox_open_idx on outbox (due_at) where state in ('waiting', 'queued');
    create function notify_outbox() returns trigger language plpgsql as $$
      begin
        perform pg_notify('outbox', new.id::text);
        return null;
      end
    $$;
    create trigger outbox_notify after insert on outbox for each row execute function notify_outbox();

    create table idempotency_keys (
      organisation_id uuid not null constraint idempotency_keys_organisation_fkey references organisations (id),
      actor_id text not null,
      key text not null,
      request_sha256 text not null,
      status integer,
      body jsonb,
      created_at timestamptz not null default now(),
      constraint idempotency_keys_pkey primary key (organisation_id, actor_id, key)
    );
    create index idempotency_keys_created_idx on idempotency_keys (created_at);
  `.execute(db);
}
