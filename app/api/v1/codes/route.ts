import { route } from '@/app/_server/route';
import { createCodeContract, listCodesContract } from '@/lib/domain/codes/schema';
import { createCode } from '@/lib/services/codes/create-code';
import { listCodes } from '@/lib/services/codes/list-codes';

export const POST = route(createCodeContract, ({ ctx, body }) => createCode(ctx, body));
export const GET = route(listCodesContract, ({ ctx, query }) => listCodes(ctx, query));
