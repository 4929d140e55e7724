import { getServer } from '@/app/_server/context';
import { route } from '@/app/_server/route';
import { readyContract } from '@/lib/domain/api/service-schema';
import { checkReady } from '@/lib/services/service/check-ready';

export const GET = route(readyContract, ({ ctx }) => checkReady(ctx, () => getServer().redis.ping()));
