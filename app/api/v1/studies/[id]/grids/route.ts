import { route } from '@/app/_server/route';
import { addGridContract } from '@/lib/domain/studies/schema';
import { addGrid } from '@/lib/services/studies/add-grid';

export const POST = route(addGridContract, ({ ctx, params, body }) => addGrid(ctx, params.id, body));
