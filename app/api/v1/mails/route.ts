import { route } from '@/app/_server/route';
import { listMailsContract } from '@/lib/domain/mail/schema';
import { listMails } from '@/lib/services/mail/list-mails';

export const GET = route(listMailsContract, ({ ctx, query }) => listMails(ctx, query));
