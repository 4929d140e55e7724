import { route } from '@/app/_server/route';
import { getStudyContract } from '@/lib/domain/studies/schema';
import { getStudy } from '@/lib/services/studies/get-study';

export const GET = route(getStudyContract, ({ ctx, params, query }) => getStudy(ctx, params.id, query.revision));
