import { route } from '@/app/_server/route';
import { deleteUploadContract, getUploadContract } from '@/lib/domain/uploads/schema';
import { deleteUpload } from '@/lib/services/uploads/delete-upload';
import { getUpload } from '@/lib/services/uploads/get-upload';

export const GET = route(getUploadContract, ({ ctx, params }) => getUpload(ctx, params.id));
export const DELETE = route(deleteUploadContract, async ({ ctx, params }) => {
  await deleteUpload(ctx, params.id);
  return undefined;
});
