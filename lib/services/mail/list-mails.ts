import { listMails as listMailRows } from '@/db/queries/mails';
import type { MailState } from '@/lib/domain/mail/mail-state';
import type { Mail } from '@/lib/domain/mail/schema';
import type { MemberContext } from '../context';
import { endPage, startPage } from '../list-page';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { mapMail } from './map-mail';

interface MailQuery { state?: MailState | undefined; limit: number; cursor?: string | undefined }

export async function listMails(ctx: MemberContext, query: MailQuery): Promise<{ items: Mail[]; nextCursor: string | null }> {
  permit(ctx, 'people.manage');
  const page = startPage(query);
  const rows = await withOrganisation(ctx, (trx) => listMailRows(trx, ctx.organisation.id, query.state ?? null, page));
  return endPage(rows, query, mapMail);
}
