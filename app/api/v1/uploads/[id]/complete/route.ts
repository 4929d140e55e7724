import { route } from '@/app/_server/route';
import { completeUploadContract } from '@/lib/domain/uploads/schema';
import { completeUpload } from '@/lib/services/uploads/complete-upload';

export const POST = route(completeUploadContract, ({ ctx, params, body }) => completeUpload(ctx, params.id, body));
