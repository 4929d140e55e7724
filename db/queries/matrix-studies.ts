import { sql, type Kysely } from 'kysely';
import type { DB, Json } from '../schema.generated';

export interface MatrixStudyRow {
  id: string; case_id: string; release_id: string; revision: number; state: string; grids_planned: number; grids_read: number;
  assessed_revision: number | null; assessed_at: Date | null; body: Json | null;
}

/**
 * Of every case and release of a code the latest study that is not abandoned: state and progress of its current
 * revision, and the assessment of the latest revision that has one.
 */
export async function listMatrixStudies(db: Kysely<DB>, organisationId: string, codeId: string): Promise<MatrixStudyRow[]> {
  const { rows } = await sql<MatrixStudyRow>`
    with latest as (
      select distinct on (studies.case_id, studies.release_id)
        studies.id, studies.case_id, studies.release_id, studies.revision, study_revisions.state
      from studies
      join cases on cases.organisation_id = studies.organisation_id and cases.id = studies.case_id
      join study_revisions on study_revisions.organisation_id = studies.organisation_id and study_revisions.study_id = studies.id
        and study_revisions.revision = studies.revision
      where studies.organisation_id = ${organisationId} and cases.code_id = ${codeId} and study_revisions.state <> 'abandoned'
      order by studies.case_id, studies.release_id, studies.id desc
    )
    select latest.*, coalesce(progress.planned, 0) as grids_planned, coalesce(progress.read, 0) as grids_read,
      assessed.study_revision as assessed_revision, assessed.created_at as assessed_at, assessed.body
    from latest
    left join lateral (
      select count(*)::int as planned, (count(*) filter (where grids.state in ('read', 'typed')))::int as read
      from grids
      where grids.organisation_id = ${organisationId} and grids.study_id = latest.id and grids.study_revision = latest.revision and grids.excluded is null
    ) progress on true
    left join lateral (
      select assessments.study_revision, assessments.created_at, assessments.body
      from assessments
      where assessments.organisation_id = ${organisationId} and assessments.study_id = latest.id
      order by assessments.study_revision desc limit 1
    ) assessed on true`.execute(db);
  return rows;
}
