import { route } from '@/app/_server/route';
import { resendMailContract } from '@/lib/domain/mail/schema';
import { resendMail } from '@/lib/services/mail/resend-mail';

export const POST = route(resendMailContract, ({ ctx, params }) => resendMail(ctx, params.id));
