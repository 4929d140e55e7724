import { sql, type Kysely } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table grid_results (
      organisation_id uuid not null,
      grid_id uuid not null,
      upload_id uuid not null,
      mapping jsonb not null,
      norms jsonb not null,
      numerics_version text not null,
      created_at timestamptz not null default now(),
      constraint grid_results_pkey primary key (organisation_id, grid_id),
      constraint grid_results_grid_fkey foreign key (organisation_id, grid_id) references grids (organisation_id, id),
      constraint grid_results_upload_fkey foreign key (organisation_id, upload_id) references uploads (organisation_id, id)
    );
    create table assessments (
      organisation_id uuid not null,
      id uuid not null,
      study_id uuid not null,
      study_revision integer not null,
      outcome text constraint assessments_outcome_check check (outcome in ('pass', 'fail', 'inconclusive', 'meets-target', 'misses-target')),
      body jsonb not null,
      inputs_sha256 text not null,
      numerics_version text not null,
      created_at timestamptz not null default now(),
      constraint assessments_pkey primary key (organisation_id, id),
      constraint assessments_revision_key unique (organisation_id, study_id, study_revision),
      constraint assessments_revision_fkey foreign key (organisation_id, study_id, study_revision)
        references study_revisions (organisation_id, study_id, revision)
    );
  `.execute(db);
}
