import { route } from '@/app/_server/route';
import { deleteTokenContract } from '@/lib/domain/tokens/schema';
import { deleteToken } from '@/lib/services/tokens/delete-token';

export const DELETE = route(deleteTokenContract, async ({ ctx, params }) => {
  await deleteToken(ctx, params.id);
  return undefined;
});
