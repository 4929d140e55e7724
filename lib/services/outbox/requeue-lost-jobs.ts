import type { Database } from '@/db/client';
import { listQueuedOutboxRows, requeueOutboxRow } from '@/db/queries/outbox';

/** A row reads as queued only after the queue has taken its job; a job that just ended may still be about to say so. */
const graceMilliseconds = 1000;

/** Rows said to be queued whose job the queue does not know wait again: it was emptied, or its process died in between. */
export async function requeueLostJobs(db: Database, now: Date, isAlive: (jobId: string) => Promise<boolean>): Promise<number> {
  const rows = await listQueuedOutboxRows(db, new Date(now.getTime() - graceMilliseconds));
  let lost = 0;
  for (const row of rows) {
    if (await isAlive(`${row.id}-${row.attempt}`)) continue;
    await requeueOutboxRow(db, row.id, row.attempt);
    lost += 1;
  }
  return lost;
}
