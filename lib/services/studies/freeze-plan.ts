import { freezeStudyRevision, type BoundRevision, type RevisionKey } from '@/db/queries/study-revisions';
import type { Trx } from '../with-organisation';

/** With the first data the plan stands: the revision keeps the case and problem it is bound to now. */
export async function freezePlan(trx: Trx, { at, bound, now }: { at: RevisionKey; bound: BoundRevision; now: Date }): Promise<void> {
  if (bound.plan_frozen_at !== null) return;
  await freezeStudyRevision(trx, at, {
    caseRevision: bound.case_revision, problemId: bound.problem_id, problemRevision: bound.problem_revision, frozenAt: now,
  });
}
