import { route } from '@/app/_server/route';
import { startUploadContract } from '@/lib/domain/uploads/schema';
import { startUpload } from '@/lib/services/uploads/start-upload';

export const POST = route(startUploadContract, ({ ctx, params, body }) => startUpload(ctx, params, body));
