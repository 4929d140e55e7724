import { deleteOldIdempotencyKeys } from '@/db/queries/idempotency-keys';
import { deleteDoneOutboxRows } from '@/db/queries/outbox';
import { listOrganisationIds } from '@/db/queries/swept-uploads';
import type { JobContext } from '../outbox/job-context';
import { withOrganisation } from '../with-organisation';
import { giveUpIdleUploads } from './give-up-idle-uploads';
import { removeReplacedFiles } from './remove-replaced-files';
import { removeStrayObjects } from './remove-stray-objects';
import { daysAgo, type SweepContext } from './sweep-context';

const outboxDays = 7;
const idempotencyDays = 1;
const outboxBatch = 1000;

/** What one run put away. */
export interface Swept { idleUploads: number; replacedFiles: number; strayObjects: number; strayMultiparts: number; idempotencyKeys: number }

/** Puts away what one organisation no longer needs. */
export async function sweepOrganisation(ctx: JobContext): Promise<Swept> {
  const idleUploads = await giveUpIdleUploads(ctx);
  const replacedFiles = await removeReplacedFiles(ctx);
  const { objects, multiparts } = await removeStrayObjects(ctx);
  const idempotencyKeys = await withOrganisation(ctx, (trx) => deleteOldIdempotencyKeys(trx, ctx.organisation.id, daysAgo(ctx, idempotencyDays)));
  return { idleUploads, replacedFiles, strayObjects: objects, strayMultiparts: multiparts, idempotencyKeys };
}

/** Removes outbox rows done a week ago; how many. */
export async function sweepOutbox(ctx: SweepContext): Promise<number> {
  let removed = 0;
  for (;;) {
    const some = await deleteDoneOutboxRows(ctx.db, daysAgo(ctx, outboxDays), outboxBatch);
    removed += some;
    if (some < outboxBatch) return removed;
  }
}

/**
 * Puts away what nobody needs any more, organisation by organisation; a fault of one is logged and leaves it to the next
 * run. Every step changes only what it finds unchanged, so two workers that sweep at once do what one does.
 */
export async function sweep(ctx: SweepContext, isOver: () => boolean): Promise<void> {
  const doneRows = await sweepOutbox(ctx);
  if (doneRows > 0) ctx.log.info({ doneRows }, 'outbox swept');
  for (const id of await listOrganisationIds(ctx.db)) {
    if (isOver()) return;
    try {
      const swept = await sweepOrganisation({ ...ctx, organisation: { id } });
      if (Object.values(swept).some((count) => count > 0)) ctx.log.info({ organisationId: id, ...swept }, 'swept');
    } catch (error) {
      ctx.log.warn({ organisationId: id, fault: error instanceof Error ? error.message : 'unknown' }, 'not swept');
    }
  }
}
