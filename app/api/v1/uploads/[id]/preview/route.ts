import { route } from '@/app/_server/route';
import { previewContract } from '@/lib/domain/uploads/schema';
import { getPreview } from '@/lib/services/uploads/get-preview';

export const GET = route(previewContract, ({ ctx, params, query }) => getPreview(ctx, params.id, query));
