import { route } from '@/app/_server/route';
import { listRechecksContract, requestRecheckContract } from '@/lib/domain/studies/recheck-schema';
import { listRechecks } from '@/lib/services/rechecks/list-rechecks';
import { requestRecheck } from '@/lib/services/rechecks/request-recheck';

export const GET = route(listRechecksContract, ({ ctx, params }) => listRechecks(ctx, params.id));
export const POST = route(requestRecheckContract, ({ ctx, params }) => requestRecheck(ctx, params.id));
