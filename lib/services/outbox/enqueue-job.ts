import { insertOutboxRow } from '@/db/queries/outbox';
import type { JobName } from '@/lib/jobs/jobs';
import { newId } from '../keys';
import type { Trx } from '../with-organisation';

interface JobToEnqueue { organisationId: string | null; job: JobName; subjectId: string; subjectRevision: number | null }

/** Writes the job into the outbox in the transaction of what it follows from; the worker's dispatcher hands it to the queue. */
export async function enqueueJob(trx: Trx, { organisationId, job, subjectId, subjectRevision }: JobToEnqueue): Promise<void> {
  await insertOutboxRow(trx, { id: newId(), organisation_id: organisationId, job, subject_id: subjectId, subject_revision: subjectRevision });
}
