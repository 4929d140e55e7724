import type { Database } from '@/db/client';
import { lockWaitingOutboxRows, updateOutboxRow } from '@/db/queries/outbox';
import { jobNameSchema, type JobName, type JobPayload } from '@/lib/jobs/jobs';

const batch = 100;

export interface JobToAdd { id: string; name: JobName; payload: JobPayload }

/**
 * Hands waiting rows to the queue, each under an id of its own for every attempt. A row counts as queued only once the
 * queue has taken it; taken twice under one id it is there once.
 */
export async function dispatchJobs(db: Database, now: Date, add: (jobs: JobToAdd[]) => Promise<void>): Promise<number> {
  return db.transaction().execute(async (trx) => {
    const rows = await lockWaitingOutboxRows(trx, now, batch);
    if (rows.length === 0) return 0;
    await add(rows.map((row) => {
      const attempt = row.attempt + 1;
      const payload = {
        outboxId: row.id, organisationId: row.organisation_id, subjectId: row.subject_id, subjectRevision: row.subject_revision, attempt,
        requestId: row.request_id,
      };
      return { id: `${row.id}-${attempt}`, name: jobNameSchema.parse(row.job), payload };
    }));
    for (const row of rows) await updateOutboxRow(trx, row.id, { state: 'queued', attempt: row.attempt + 1, queued_at: now });
    return rows.length;
  });
}
