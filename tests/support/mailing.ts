import { randomUUID } from 'node:crypto';
import { SMTPServer, type SMTPServerOptions } from 'smtp-server';
import type { LetterFacts } from '@/lib/domain/mail/letter-facts';
import { createMailer } from '@/lib/platform/mailer';
import type { MailJobContext } from '@/lib/services/outbox/job-context';
import { adminDatabase } from './admin-database';
import { need } from './environment';

type MailContext = Pick<MailJobContext, 'mailer' | 'publicUrl'>;

/** What a worker sends with: to the inbox of the test run, or to the port of another server. */
export function mailContext(smtpUrl = need('SMTP_URL')): MailContext {
  return { mailer: createMailer({ smtpUrl, from: need('MAIL_FROM'), patience: 2000 }), publicUrl: need('PUBLIC_URL') };
}

/** A mail server that misbehaves as told, on a port of its own. */
export async function openMailServer(options: SMTPServerOptions): Promise<{ url: string; close: () => Promise<void> }> {
  const server = new SMTPServer({ disabledCommands: ['STARTTLS'], authOptional: true, ...options });
  // Connections that break are what these tests are about.
  server.on('error', () => undefined);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const address = server.server.address();
  if (address === null || typeof address === 'string') throw new Error('The mail server has no port.');
  return { url: `smtp://127.0.0.1:${address.port}`, close: () => new Promise((resolve) => server.close(resolve)) };
}

/** A mail that waits to be sent, without a job that would send it. */
export async function insertWaitingMail(organisationId: string, address: string): Promise<string> {
  const id = randomUUID();
  const facts: LetterFacts = { kind: 'membership-changed', organisation: 'Mail Works', slug: 'mail-works', by: 'owner@northmoor.example', roles: ['engineer'], until: null };
  await adminDatabase().query(
    'insert into mails (id, organisation_id, address, kind, facts) values ($1, $2, $3, $4, $5)', [id, organisationId, address, facts.kind, JSON.stringify(facts)],
  );
  return id;
}
