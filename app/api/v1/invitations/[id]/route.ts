import { route } from '@/app/_server/route';
import { revokeInvitationContract } from '@/lib/domain/invitations/schema';
import { revokeInvitation } from '@/lib/services/invitations/revoke-invitation';

export const DELETE = route(revokeInvitationContract, async ({ ctx, params }) => {
  await revokeInvitation(ctx, params.id);
  return undefined;
});
