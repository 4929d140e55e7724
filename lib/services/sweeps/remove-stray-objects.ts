import { listNamedKeys } from '@/db/queries/swept-uploads';
import type { StoredObject } from '@/lib/platform/storage';
import type { JobContext } from '../outbox/job-context';
import { isUploadKey } from '../uploads/storage-key';
import { withOrganisation } from '../with-organisation';
import { daysAgo } from './sweep-context';

const batch = 500;
/** A run that finds more leaves the rest to the next one. */
const mostRemoved = 1000;

type Found = StoredObject & { multipartId?: string };

async function* inBatches(found: AsyncIterable<Found>, before: Date): AsyncGenerator<Found[]> {
  let old: Found[] = [];
  for await (const each of found) {
    // What is younger may be on its way: objects are written before the row that names them.
    if (each.since >= before || !isUploadKey(each.key)) continue;
    old.push(each);
    if (old.length < batch) continue;
    yield old;
    old = [];
  }
  if (old.length > 0) yield old;
}

async function removeUnnamed(ctx: JobContext, found: AsyncIterable<Found>): Promise<number> {
  let removed = 0;
  for await (const old of inBatches(found, daysAgo(ctx, 1))) {
    const named = await withOrganisation(ctx, (trx) => listNamedKeys(trx, ctx.organisation.id, old.map(({ key }) => key)));
    for (const { key, multipartId } of old) {
      const isNamed = named.some((row) => row.storage_key === key && (multipartId === undefined || (row.state === 'receiving' && row.multipart_id === multipartId)));
      if (isNamed) continue;
      if (multipartId === undefined) await ctx.storage.remove(key);
      else await ctx.storage.abortMultipart(key, multipartId);
      removed += 1;
      if (removed >= mostRemoved) return removed;
    }
  }
  return removed;
}

/**
 * Removes what lies under the organisation in storage for more than a day without a row that names it, as where a
 * process died between the two; how many objects and how many uploads in parts.
 */
export async function removeStrayObjects(ctx: JobContext): Promise<{ objects: number; multiparts: number }> {
  const prefix = `${ctx.organisation.id}/`;
  return {
    objects: await removeUnnamed(ctx, ctx.storage.listObjects(prefix)),
    multiparts: await removeUnnamed(ctx, ctx.storage.listMultiparts(prefix)),
  };
}
