import { getServer } from '@/app/_server/context';
import { route } from '@/app/_server/route';
import { changePasswordContract } from '@/lib/domain/people/account-schema';
import { changePassword } from '@/lib/services/account/change-password';

export const POST = route(changePasswordContract, async ({ ctx, request, body }) => {
  await changePassword(ctx, getServer().sessions.readCookie(request.headers.get('cookie') ?? ''), body);
  return undefined;
});
