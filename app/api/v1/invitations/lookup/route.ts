import { route } from '@/app/_server/route';
import { lookUpInvitationContract } from '@/lib/domain/invitations/schema';
import { lookUpInvitation } from '@/lib/services/invitations/look-up-invitation';

export const POST = route(lookUpInvitationContract, ({ ctx, address, body }) => lookUpInvitation(ctx, address, body.token));
