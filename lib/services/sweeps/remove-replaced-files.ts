import { giveUpReplacedUploads } from '@/db/queries/swept-uploads';
import type { JobContext } from '../outbox/job-context';
import { withOrganisation } from '../with-organisation';
import { daysAgo } from './sweep-context';

const batch = 100;

/**
 * Removes files that were replaced more than a day ago and that no revision of their study names, so that no assessment
 * was made from them; how many. The row is given up first: an object left behind is found as one that no row names.
 */
export async function removeReplacedFiles(ctx: JobContext): Promise<number> {
  const replaced = await withOrganisation(ctx, (trx) => giveUpReplacedUploads(trx, ctx.organisation.id, daysAgo(ctx, 1), batch));
  for (const { storage_key } of replaced) await ctx.storage.remove(storage_key);
  return replaced.length;
}
