import { route } from '@/app/_server/route';
import { getGridResultContract } from '@/lib/domain/studies/schema';
import { getGridResult } from '@/lib/services/studies/get-grid-result';

export const GET = route(getGridResultContract, ({ ctx, params, query }) => getGridResult(ctx, params, query.revision));
