import { route } from '@/app/_server/route';
import { putColumnsContract } from '@/lib/domain/cases/schema';
import { putColumns } from '@/lib/services/cases/put-columns';

export const PUT = route(putColumnsContract, ({ ctx, params, body }) => putColumns(ctx, params.case, body));
