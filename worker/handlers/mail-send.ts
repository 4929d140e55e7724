import { sendMail } from '@/lib/services/mail/send-mail';
import type { JobHandler } from '../job-handler';

export const handleMailSend: JobHandler = (ctx, { organisationId, subjectId }) => sendMail(ctx, { organisationId, mailId: subjectId });
