import { getServer } from '@/app/_server/context';
import { drainSignal } from '@/app/_server/request-record';
import { route } from '@/app/_server/route';
import { readyContract } from '@/lib/domain/api/service-schema';
import { AppError } from '@/lib/errors';
import { checkReady } from '@/lib/services/service/check-ready';

export const GET = route(readyContract, ({ ctx }) => {
  if (drainSignal().aborted) throw new AppError('unavailable', 'This process is ending. Ask another.');
  return checkReady(ctx, () => getServer().redis.ping());
});
