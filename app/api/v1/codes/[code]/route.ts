import { route } from '@/app/_server/route';
import { getCodeContract } from '@/lib/domain/codes/schema';
import { getCode } from '@/lib/services/codes/get-code';

export const GET = route(getCodeContract, ({ ctx, params }) => getCode(ctx, params.code));
