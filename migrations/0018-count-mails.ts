import { sql, type Kysely } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    -- How many mails are not out, whosever they are: a number for the metrics.
    create index mails_open_idx on mails (state) where state <> 'sent';
    create policy mails_lookup on mails for select to fourfold_lookup using (true);
    grant usage, create on schema public to fourfold_lookup;
    grant select (state) on mails to fourfold_lookup;
    create function count_open_mails() returns table (state text, count bigint)
      language sql stable security definer set search_path = public, pg_temp
      as $$ select m.state, count(*) from mails m where m.state <> 'sent' group by m.state $$;
    revoke execute on function count_open_mails() from public;
    grant execute on function count_open_mails() to fourfold_app;
    alter function count_open_mails() owner to fourfold_lookup;
    revoke create on schema public from fourfold_lookup;
  `.execute(db);
}
