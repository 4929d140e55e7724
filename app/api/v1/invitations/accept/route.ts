import { getServer } from '@/app/_server/context';
import { identify } from '@/app/_server/identify';
import { route } from '@/app/_server/route';
import { acceptInvitationContract } from '@/lib/domain/invitations/schema';
import { acceptInvitation } from '@/lib/services/invitations/accept-invitation';

export const POST = route(acceptInvitationContract, async ({ ctx, address, body, request, headers }) => {
  const caller = request.headers.has('authorization') ? null : await identify(request.headers);
  const { me, needsSession } = await acceptInvitation(ctx, { address, signedIn: caller?.user ?? null, input: body });
  if (needsSession) headers.append('set-cookie', await getServer().sessions.create(me.id));
  return me;
});
