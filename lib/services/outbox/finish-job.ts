import type { Database } from '@/db/client';
import { updateOutboxRow } from '@/db/queries/outbox';

/** The handler has ended: only now is the row done. */
export async function finishJob(db: Database, outboxId: string, now: Date): Promise<void> {
  await updateOutboxRow(db, outboxId, { state: 'done', done_at: now, last_error: null });
}
