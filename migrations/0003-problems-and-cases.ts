import { sql, type Kysely } from 'kysely';

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create table problems (
      organisation_id uuid not null constraint problems_organisation_fkey references organisations (id),
      id uuid not null,
      slug text not null,
      revision integer not null default 1,
      created_by text not null constraint problems_created_by_fkey references users (id),
      created_at timestamptz not null default now(),
      constraint problems_pkey primary key (organisation_id, id),
      constraint problems_slug_key unique (organisation_id, slug)
    );
    create table problem_revisions (
      organisation_id uuid not null,
      problem_id uuid not null,
      revision integer not null,
      name text not null,
      definition jsonb not null,
      created_by text not null constraint problem_revisions_created_by_fkey references users (id),
      created_at timestamptz not null default now(),
      constraint problem_revisions_pkey primary key (organisation_id, problem_id, revision),
      constraint problem_revisions_problem_fkey foreign key (organisation_id, problem_id) references problems (organisation_id, id)
    );
    create table cases (
      organisation_id uuid not null constraint cases_organisation_fkey references organisations (id),
      id uuid not null,
      code_id uuid not null,
      slug text not null,
      kind text not null constraint cases_kind_check check (kind in ('order', 'exactness', 'benchmark', 'solution')),
      revision integer not null default 1,
      columns jsonb,
      created_by text not null constraint cases_created_by_fkey references users (id),
      created_at timestamptz not null default now(),
      constraint cases_pkey primary key (organisation_id, id),
      constraint cases_slug_key unique (organisation_id, slug),
      constraint cases_code_fkey foreign key (organisation_id, code_id) references codes (organisation_id, id)
    );
    create index cases_code_idx on cases (organisation_id, code_id);
    create table case_revisions (
      organisation_id uuid not null,
      case_id uuid not null,
      revision integer not null,
      name text not null,
      problem_id uuid not null,
      definition jsonb not null,
      created_by text not null constraint case_revisions_created_by_fkey references users (id),
      created_at timestamptz not null default now(),
      constraint case_revisions_pkey primary key (organisation_id, case_id, revision),
      constraint case_revisions_case_fkey foreign key (organisation_id, case_id) references cases (organisation_id, id),
      constraint case_revisions_problem_fkey foreign key (organisation_id, problem_id) references problems (organisation_id, id)
    );
    create index case_revisions_problem_idx on case_revisions (organisation_id, problem_id);
  `.execute(db);
}
