import { route } from '@/app/_server/route';
import { getProblemContract, updateProblemContract } from '@/lib/domain/problems/schema';
import { getProblem } from '@/lib/services/problems/get-problem';
import { updateProblem } from '@/lib/services/problems/update-problem';

export const GET = route(getProblemContract, ({ ctx, params }) => getProblem(ctx, params.problem));
export const PATCH = route(updateProblemContract, ({ ctx, params, ifMatch, body }) => updateProblem(ctx, params.problem, ifMatch, body));
