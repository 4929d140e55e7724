import { sql, type Kysely } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    -- The request a job follows from, set for the transaction that writes the row: only for the log.
    alter table outbox add column request_id text default nullif(current_setting('app.request_id', true), '');

    -- How many files are on their way, whoever sends them: a number for the metrics, which belong to no organisation.
    create policy uploads_lookup on uploads for select to fourfold_lookup using (true);
    grant usage, create on schema public to fourfold_lookup;
    grant select (state) on uploads to fourfold_lookup;
    create function count_receiving_uploads() returns bigint
      language sql stable security definer set search_path = public, pg_temp
      as $$ select count(*) from uploads where state = 'receiving' $$;
    revoke execute on function count_receiving_uploads() from public;
    grant execute on function count_receiving_uploads() to fourfold_app;
    alter function count_receiving_uploads() owner to fourfold_lookup;
    revoke create on schema public from fourfold_lookup;
  `.execute(db);
}
