import { route } from '@/app/_server/route';
import { getCaseContract, updateCaseContract } from '@/lib/domain/cases/schema';
import { getCase } from '@/lib/services/cases/get-case';
import { updateCase } from '@/lib/services/cases/update-case';

export const GET = route(getCaseContract, ({ ctx, params }) => getCase(ctx, params.case));
export const PATCH = route(updateCaseContract, ({ ctx, params, ifMatch, body }) => updateCase(ctx, params.case, ifMatch, body));
