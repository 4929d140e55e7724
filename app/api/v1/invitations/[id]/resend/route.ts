import { route } from '@/app/_server/route';
import { resendInvitationContract } from '@/lib/domain/invitations/schema';
import { resendInvitation } from '@/lib/services/invitations/resend-invitation';

export const POST = route(resendInvitationContract, ({ ctx, params }) => resendInvitation(ctx, params.id));
