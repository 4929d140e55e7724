import { getServer } from '@/app/_server/context';
import { route } from '@/app/_server/route';
import { signOutEverywhereContract } from '@/lib/domain/people/schema';
import { AppError } from '@/lib/errors';

export const DELETE = route(signOutEverywhereContract, async ({ ctx, headers }) => {
  if (ctx.token) throw new AppError('not-allowed', 'A token cannot end the sessions of its owner. Sign in.');
  headers.append('set-cookie', await getServer().sessions.endAll(ctx.userId));
  return undefined;
});
