import { countGrids } from '@/db/queries/grids';
import { updateRevisionState, type RevisionKey } from '@/db/queries/study-revisions';
import { enqueueJob } from '../outbox/enqueue-job';
import type { Trx } from '../with-organisation';

/**
 * Sends a revision to assessment where every grid that is not left out is read or typed; whether it did. The revision
 * must be held by the caller, or the last two of its grids could overlook each other.
 */
export async function settleStudy(trx: Trx, at: RevisionKey, now: Date): Promise<boolean> {
  const { ready, open } = await countGrids(trx, at);
  if (ready === 0 || open > 0) return false;
  const isSettled = await updateRevisionState(trx, at, ['collecting'], { state: 'assessing', since: now });
  if (isSettled) {
    await enqueueJob(trx, { organisationId: at.organisationId, job: 'study.assess', subjectId: at.studyId, subjectRevision: at.revision });
  }
  return isSettled;
}
