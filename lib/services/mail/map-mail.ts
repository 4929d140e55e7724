import type { MailRow } from '@/db/queries/mails';
import { mailKindSchema } from '@/lib/domain/mail/letter-facts';
import { mailStateSchema } from '@/lib/domain/mail/mail-state';
import type { Mail } from '@/lib/domain/mail/schema';

export function mapMail(row: MailRow): Mail {
  return {
    id: row.id, to: row.address, kind: mailKindSchema.parse(row.kind), state: mailStateSchema.parse(row.state), fault: row.fault,
    createdAt: row.created_at.toISOString(), claimedAt: row.claimed_at?.toISOString() ?? null, sentAt: row.sent_at?.toISOString() ?? null,
  };
}
