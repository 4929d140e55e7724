import { route } from '@/app/_server/route';
import { getMatrixContract } from '@/lib/domain/matrix/schema';
import { getMatrix } from '@/lib/services/matrix/get-matrix';

export const GET = route(getMatrixContract, ({ ctx, params }) => getMatrix(ctx, params.code));
