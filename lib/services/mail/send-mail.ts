import { updateMail, type MailRow } from '@/db/queries/mails';
import { letterHtml } from '@/lib/domain/mail/letter-html';
import { letterText } from '@/lib/domain/mail/letter-text';
import { letterFactsSchema } from '@/lib/domain/mail/letter-facts';
import { usualMailPreferences } from '@/lib/domain/mail/preferences';
import { writeLetter } from '@/lib/domain/mail/write-letter';
import type { OutgoingMail } from '@/lib/platform/mailer';
import type { MailJobContext } from '../outbox/job-context';
import { withOrganisation } from '../with-organisation';
import { makeLinkToken } from './make-link-token';

interface MailKey { organisationId: string | null; mailId: string }

/** How long the mail server is given to take a mail it refuses for now. */
const patienceMilliseconds = 24 * 3600_000;

/** Claims the mail, so that no other process sends it, and makes its link in the same transaction. */
function claim(ctx: MailJobContext, { organisationId, mailId }: MailKey): Promise<{ mail: MailRow; token: string | null } | null> {
  return withOrganisation(ctx, async (trx) => {
    const now = ctx.clock();
    const mail = await updateMail(trx, { organisationId, id: mailId, from: ['queued'] }, { state: 'sending', claimed_at: now, fault: null });
    if (!mail) return null;
    const { isNeeded, token } = await makeLinkToken(trx, mail, now);
    if (isNeeded) return { mail, token };
    await updateMail(trx, { organisationId, id: mailId, from: ['sending'] }, { state: 'cancelled', fault: 'What it was about had ended before it was sent.' });
    return null;
  });
}

function compose(ctx: MailJobContext, mail: MailRow, token: string | null): OutgoingMail {
  const letter = writeLetter(letterFactsSchema.parse(mail.facts), { base: ctx.publicUrl, token });
  return {
    messageId: `<${mail.id}.${mail.resends}@${new URL(ctx.publicUrl).hostname}>`, to: mail.address, date: ctx.clock(),
    subject: letter.subject, text: letterText(letter), html: letterHtml(letter),
    preferencesUrl: mail.kind in usualMailPreferences ? new URL('/account', ctx.publicUrl).href : null,
  };
}

/**
 * Sends a mail at most once. Refused for now it waits and is tried again; refused for good it has failed. Where nobody can
 * know whether it went out, also because this process died in between, it stays claimed and is shown to the owners.
 */
export async function sendMail(ctx: MailJobContext, key: MailKey): Promise<void> {
  const claimed = await claim(ctx, key);
  if (!claimed) return;
  const { mail, token } = claimed;
  const delivery = await ctx.mailer.deliver(compose(ctx, mail, token));
  const settle = (changes: { state?: string; fault?: string; sent_at?: Date }) => withOrganisation(ctx, (trx) =>
    updateMail(trx, { organisationId: key.organisationId, id: key.mailId, from: ['sending'] }, changes));
  if (delivery.end === 'accepted') {
    await settle({ state: 'sent', sent_at: ctx.clock() });
  } else if (delivery.end === 'unknown') {
    await settle({ fault: `The connection ended while it was sent: ${delivery.fault}` });
  } else if (delivery.isForGood || ctx.clock().getTime() - mail.created_at.getTime() > patienceMilliseconds) {
    await settle({ state: 'failed', fault: delivery.fault });
  } else {
    await settle({ state: 'queued', fault: delivery.fault });
    throw new Error(`The mail server does not take mail ${mail.id} for now: ${delivery.fault}`);
  }
}
