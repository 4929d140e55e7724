import { sql, type Kysely } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table rechecks (
      organisation_id uuid not null,
      id uuid not null,
      study_id uuid not null,
      study_revision integer not null,
      state text not null default 'running' constraint rechecks_state_check check (state in ('running', 'done')),
      -- Null while it runs.
      result text constraint rechecks_result_check check (result in ('identical', 'within-1e-10', 'not-reproduced')),
      largest_difference double precision,
      differences jsonb not null default '[]',
      numerics_version text not null,
      requested_by text not null constraint rechecks_requested_by_fkey references users (id),
      created_at timestamptz not null default now(),
      finished_at timestamptz,
      constraint rechecks_pkey primary key (organisation_id, id),
      constraint rechecks_revision_fkey foreign key (organisation_id, study_id, study_revision)
        references study_revisions (organisation_id, study_id, revision),
      constraint rechecks_done_check check ((state = 'done') = (result is not null and finished_at is not null))
    );
    create unique index rechecks_running_key on rechecks (organisation_id, study_id) where state = 'running';
    create index rechecks_study_index on rechecks (organisation_id, study_id, created_at desc);

    alter table rechecks enable row level security;
    alter table rechecks force row level security;
    create policy rechecks_tenant on rechecks to fourfold_app
      using (organisation_id = current_organisation()) with check (organisation_id = current_organisation());
    create policy rechecks_maintenance on rechecks for select to fourfold_maintenance using (true);
    grant select, insert, update, delete on rechecks to fourfold_app;
    grant select on rechecks to fourfold_maintenance;
  `.execute(db);
}
