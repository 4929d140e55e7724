import { route } from '@/app/_server/route';
import { requestResetContract } from '@/lib/domain/people/account-schema';
import { requestReset } from '@/lib/services/account/request-reset';

export const POST = route(requestResetContract, ({ ctx, address, body }) => requestReset(ctx, address, body));
