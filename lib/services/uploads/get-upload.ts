import type { Upload } from '@/lib/domain/uploads/schema';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { mapUpload } from './map-upload';
import { requireUpload } from './require-upload';

/** An upload with the parts stored so far, from which a browser goes on after a break. */
export async function getUpload(ctx: MemberContext, id: string): Promise<Upload> {
  permit(ctx, 'work.read');
  const loaded = await withOrganisation(ctx, (trx) => requireUpload(ctx, trx, id));
  const { upload } = loaded;
  const isOpen = upload.state === 'receiving' && upload.multipart_id !== null;
  const parts = isOpen ? await ctx.storage.findParts(upload.storage_key, upload.multipart_id ?? '') : null;
  return mapUpload(loaded, parts ?? []);
}
