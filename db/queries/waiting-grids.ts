import { sql, type Kysely } from 'kysely';
import type { DB } from '../schema.generated';

/** Grids of the case whose file waits for columns or was rejected under the old ones, in the current revision of studies still collecting: stored again. */
export async function resumeWaitingGrids(db: Kysely<DB>, organisationId: string, caseId: string) {
  const { rows } = await sql<{ id: string; study_id: string; label: string }>`
    update grids set state = 'stored', reasons = '[]'
    from studies, study_revisions
    where grids.organisation_id = ${organisationId} and grids.state in ('needs-columns', 'rejected')
      and studies.organisation_id = grids.organisation_id and studies.id = grids.study_id
      and studies.case_id = ${caseId} and studies.revision = grids.study_revision
      and study_revisions.organisation_id = grids.organisation_id and study_revisions.study_id = grids.study_id
      and study_revisions.revision = grids.study_revision and study_revisions.state = 'collecting'
    returning grids.id, grids.study_id, grids.label`.execute(db);
  return rows;
}
