import { sql, type Kysely } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    -- The fingerprint is of the first and the last megabyte: whoever chooses the same file again goes on with it.
    alter table uploads add column last_activity_at timestamptz not null default now();
    alter table uploads add column fingerprint text;
    create index uploads_receiving_idx on uploads (organisation_id, last_activity_at) where state = 'receiving';

    -- Null: the quota of the installation holds.
    alter table organisations add column storage_quota_bytes bigint
      constraint organisations_storage_quota_check check (storage_quota_bytes >= 0);

    create index outbox_done_idx on outbox (done_at) where state = 'done';
  `.execute(db);

  await sql`
    -- Sweeps go from organisation to organisation; all they may know before is which there are.
    grant usage, create on schema public to fourfold_lookup;
    grant select (id) on organisations to fourfold_lookup;
    create policy organisations_lookup on organisations for select to fourfold_lookup using (true);
    create function list_organisation_ids() returns setof uuid
      language sql stable security definer set search_path = public, pg_temp
      as $$ select id from organisations order by id $$;
    revoke execute on function list_organisation_ids() from public;
    grant execute on function list_organisation_ids() to fourfold_app;
    alter function list_organisation_ids() owner to fourfold_lookup;
    revoke create on schema public from fourfold_lookup;
  `.execute(db);
}
