import type { RecheckRow } from '@/db/queries/rechecks';
import { recheckSchema, type Recheck } from '@/lib/domain/studies/recheck-schema';

export function mapRecheck(row: RecheckRow): Recheck {
  return recheckSchema.parse({
    id: row.id, study: row.study_id, revision: row.study_revision, state: row.state, result: row.result, largestDifference: row.largest_difference,
    differences: row.differences, numericsVersion: row.numerics_version, requestedBy: row.requested_by_email,
    createdAt: row.created_at.toISOString(), finishedAt: row.finished_at?.toISOString() ?? null,
  });
}
