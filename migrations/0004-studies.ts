import { sql, type Kysely } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table studies (
      organisation_id uuid not null constraint studies_organisation_fkey references organisations (id),
      id uuid not null,
      case_id uuid not null,
      release_id uuid not null,
      refinement text not null constraint studies_refinement_check check (refinement in ('space', 'time', 'space-time')),
      dimension integer not null constraint studies_dimension_check check (dimension between 1 and 3),
      revision integer not null default 1,
      created_by text not null constraint studies_created_by_fkey references users (id),
      created_at timestamptz not null default now(),
      constraint studies_pkey primary key (organisation_id, id),
      constraint studies_case_fkey foreign key (organisation_id, case_id) references cases (organisation_id, id),
      constraint studies_release_fkey foreign key (organisation_id, release_id) references releases (organisation_id, id)
    );
    create index studies_case_idx on studies (organisation_id, case_id);
    create index studies_release_idx on studies (organisation_id, release_id);

    -- The case and problem revisions follow the latest ones until the plan is frozen by the first data.
    create table study_revisions (
      organisation_id uuid not null,
      study_id uuid not null,
      revision integer not null,
      case_id uuid not null,
      case_revision integer not null,
      problem_id uuid not null,
      problem_revision integer not null,
      rule_revision integer not null,
      state text not null default 'collecting' constraint study_revisions_state_check check (state in
        ('collecting', 'assessing', 'assessment-failed', 'assessed', 'in-review', 'signed', 'superseded', 'withdrawn', 'abandoned')),
      state_since timestamptz not null default now(),
      plan_frozen_at timestamptz,
      failure text,
      created_by text not null constraint study_revisions_created_by_fkey references users (id),
      created_at timestamptz not null default now(),
      constraint study_revisions_pkey primary key (organisation_id, study_id, revision),
      constraint study_revisions_study_fkey foreign key (organisation_id, study_id) references studies (organisation_id, id),
      constraint study_revisions_case_fkey foreign key (organisation_id, case_id, case_revision)
        references case_revisions (organisation_id, case_id, revision),
      constraint study_revisions_problem_fkey foreign key (organisation_id, problem_id, problem_revision)
        references problem_revisions (organisation_id, problem_id, revision)
    );

    create table grids (
      organisation_id uuid not null,
      id uuid not null,
      study_id uuid not null,
      study_revision integer not null,
      label text not null,
      definition jsonb not null,
      state text not null default 'expected' constraint grids_state_check check (state in
        ('expected', 'typed', 'receiving', 'stored', 'needs-columns', 'reading', 'read', 'rejected')),
      excluded text,
      after_data boolean not null default false,
      upload_id uuid,
      rows_read bigint,
      reasons jsonb not null default '[]',
      revision integer not null default 1,
      created_at timestamptz not null default now(),
      constraint grids_pkey primary key (organisation_id, id),
      constraint grids_label_key unique (organisation_id, study_id, study_revision, label),
      constraint grids_revision_fkey foreign key (organisation_id, study_id, study_revision)
        references study_revisions (organisation_id, study_id, revision)
    );

    -- grid_id is the grid it was made for; a later revision's grid may name the same upload.
    create table uploads (
      organisation_id uuid not null,
      id uuid not null,
      grid_id uuid not null,
      filename text not null,
      bytes bigint not null,
      stated_sha256 text,
      sha256 text,
      storage_key text not null,
      multipart_id text,
      part_size bigint,
      state text not null default 'receiving' constraint uploads_state_check check (state in ('receiving', 'stored', 'given-up')),
      preview jsonb,
      created_by text not null constraint uploads_created_by_fkey references users (id),
      token_id uuid,
      created_at timestamptz not null default now(),
      stored_at timestamptz,
      constraint uploads_pkey primary key (organisation_id, id),
      constraint uploads_storage_key_key unique (storage_key),
      constraint uploads_grid_fkey foreign key (organisation_id, grid_id) references grids (organisation_id, id)
    );
    create index uploads_grid_idx on uploads (organisation_id, grid_id);
    alter table grids add constraint grids_upload_fkey foreign key (organisation_id, upload_id) references uploads (organisation_id, id);
  `.execute(db);
}
