import { Readable } from 'node:stream';
import MailComposer from 'nodemailer/lib/mail-composer';
import SMTPConnection from 'nodemailer/lib/smtp-connection';

export interface OutgoingMail {
  /** With its angle brackets; the same for the same event, whenever it is sent. */
  messageId: string;
  to: string;
  subject: string;
  text: string;
  html: string;
  date: Date;
  /** Where the person chooses which mails come; null for mails that always come. */
  preferencesUrl: string | null;
}

/** `unknown`: the message had begun to go out when the connection ended, so that sending it again may send it twice. */
export type Delivery = { end: 'accepted' } | { end: 'refused'; isForGood: boolean; fault: string } | { end: 'unknown'; fault: string };

export interface Mailer { deliver(mail: OutgoingMail): Promise<Delivery> }

const connectWithin = 10_000;
const answerWithin = 30_000;

function connectionOptions(url: URL, patience: number) {
  const isSecure = url.protocol === 'smtps:';
  return {
    host: url.hostname, port: Number(url.port) || (isSecure ? 465 : 25), secure: isSecure,
    connectionTimeout: connectWithin, greetingTimeout: connectWithin, socketTimeout: patience,
  };
}

function compose(mail: OutgoingMail, from: string): Promise<Buffer> {
  const headers: Record<string, string> = { 'Auto-Submitted': 'auto-generated' };
  if (mail.preferencesUrl !== null) headers['List-Unsubscribe'] = `<${mail.preferencesUrl}>`;
  const { messageId, to, subject, text, html, date } = mail;
  return new MailComposer({ from, to, subject, text, html, messageId, date, headers }).compile().build();
}

interface MailerOptions {
  smtpUrl: string;
  /** An address, with or without a name. */
  from: string;
  /** Milliseconds that the server may be silent. */
  patience?: number;
}

/** Mail over SMTP, one connection a message. */
export function createMailer({ smtpUrl, from, patience = answerWithin }: MailerOptions): Mailer {
  const url = new URL(smtpUrl);
  const user = decodeURIComponent(url.username);
  const sender = /<([^>]+)>/.exec(from)?.[1] ?? from;

  return {
    async deliver(mail) {
      const source = await compose(mail, from);
      const connection = new SMTPConnection(connectionOptions(url, patience));
      // Read from only once the server has said that it takes the message.
      let hasBegun = false;
      const message = new Readable({
        read() {
          hasBegun = true;
          this.push(source);
          this.push(null);
        },
      });
      return new Promise<Delivery>((resolve) => {
        const finish = (delivery: Delivery) => {
          if (delivery.end === 'accepted') connection.quit();
          else connection.close();
          resolve(delivery);
        };
        const fail = (error: Error & { responseCode?: number | undefined }) => {
          const fault = error.message.slice(0, 500);
          const code = error.responseCode;
          if (code === undefined && hasBegun) finish({ end: 'unknown', fault });
          else finish({ end: 'refused', isForGood: code !== undefined && code >= 500, fault });
        };
        const submit = () => connection.send({ from: sender, to: mail.to }, message, (error) => {
          if (error) fail(error);
          else finish({ end: 'accepted' });
        });
        connection.once('error', fail);
        connection.connect((error) => {
          if (error) fail(error);
          else if (user === '') submit();
          else {
            connection.login({ user, pass: decodeURIComponent(url.password) }, (refusal) => {
              if (refusal) fail(refusal);
              else submit();
            });
          }
        });
      });
    },
  };
}
