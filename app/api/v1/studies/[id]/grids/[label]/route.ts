import { route } from '@/app/_server/route';
import { updateGridContract } from '@/lib/domain/studies/schema';
import { updateGrid } from '@/lib/services/studies/update-grid';

export const PATCH = route(updateGridContract, ({ ctx, params, ifMatch, body }) => updateGrid(ctx, params, ifMatch, body));
