import { route } from '@/app/_server/route';
import { createCaseContract, listCasesContract } from '@/lib/domain/cases/schema';
import { createCase } from '@/lib/services/cases/create-case';
import { listCases } from '@/lib/services/cases/list-cases';

export const POST = route(createCaseContract, ({ ctx, body }) => createCase(ctx, body));
export const GET = route(listCasesContract, ({ ctx, query }) => listCases(ctx, query));
