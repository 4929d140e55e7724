import { getServer } from '@/app/_server/context';
import { route } from '@/app/_server/route';
import { signUpContract } from '@/lib/domain/people/schema';
import { signUp } from '@/lib/services/people/sign-up';

export const POST = route(signUpContract, async ({ ctx, address, body, headers }) => {
  const me = await signUp(ctx, address, body);
  headers.append('set-cookie', await getServer().sessions.create(me.id));
  return me;
});
