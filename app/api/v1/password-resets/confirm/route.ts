import { route } from '@/app/_server/route';
import { confirmResetContract } from '@/lib/domain/people/account-schema';
import { confirmReset } from '@/lib/services/account/confirm-reset';

export const POST = route(confirmResetContract, async ({ ctx, address, body }) => {
  await confirmReset(ctx, address, body);
  return undefined;
});
