import type { UploadRow } from '@/db/queries/uploads';
import type { Context } from '../context';

/** Frees the parts of an upload that was given up. Parts that stay behind take room but harm nothing, so that is only logged. */
export async function abandonParts(ctx: Pick<Context, 'storage' | 'log'>, upload: Pick<UploadRow, 'id' | 'storage_key' | 'multipart_id'>): Promise<void> {
  if (upload.multipart_id === null) return;
  try {
    await ctx.storage.abortMultipart(upload.storage_key, upload.multipart_id);
  } catch (error) {
    ctx.log.warn({ uploadId: upload.id, fault: error instanceof Error ? error.message : 'unknown' }, 'parts left behind');
  }
}
