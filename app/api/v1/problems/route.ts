import { route } from '@/app/_server/route';
import { createProblemContract, listProblemsContract } from '@/lib/domain/problems/schema';
import { createProblem } from '@/lib/services/problems/create-problem';
import { listProblems } from '@/lib/services/problems/list-problems';

export const POST = route(createProblemContract, ({ ctx, body }) => createProblem(ctx, body));
export const GET = route(listProblemsContract, ({ ctx, query }) => listProblems(ctx, query));
