import { route } from '@/app/_server/route';
import { createInvitationContract, listInvitationsContract } from '@/lib/domain/invitations/schema';
import { createInvitation } from '@/lib/services/invitations/create-invitation';
import { listInvitations } from '@/lib/services/invitations/list-invitations';

export const POST = route(createInvitationContract, ({ ctx, body }) => createInvitation(ctx, body));
export const GET = route(listInvitationsContract, ({ ctx, query }) => listInvitations(ctx, query));
