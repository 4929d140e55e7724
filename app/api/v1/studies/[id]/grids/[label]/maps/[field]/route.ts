import { route } from '@/app/_server/route';
import { getGridMapContract } from '@/lib/domain/studies/map-schema';
import { getGridMap } from '@/lib/services/studies/get-grid-map';

export const GET = route(getGridMapContract, ({ ctx, params, query }) => getGridMap(ctx, params, query));
