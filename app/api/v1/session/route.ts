import { getServer } from '@/app/_server/context';
import { route } from '@/app/_server/route';
import { signInContract, signOutContract } from '@/lib/domain/people/schema';
import { AppError } from '@/lib/errors';
import { signIn } from '@/lib/services/people/sign-in';

export const POST = route(signInContract, async ({ ctx, address, body, headers }) => {
  const me = await signIn(ctx, address, body);
  headers.append('set-cookie', await getServer().sessions.create(me.id));
  return me;
});

export const DELETE = route(signOutContract, async ({ ctx, request, headers }) => {
  const { sessions } = getServer();
  const sessionId = sessions.readCookie(request.headers.get('cookie') ?? '');
  if (ctx.token || sessionId === null) throw new AppError('not-allowed', 'A token has no session to end. Withdraw the token instead.');
  headers.append('set-cookie', await sessions.end(sessionId));
  return undefined;
});
