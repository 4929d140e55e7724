import { need } from './environment';

export interface ReceivedMail { id: string; from: string; to: string[]; subject: string; messageId: string | null; text: string; html: string | null; source: string }

export async function listInbox(address: string): Promise<ReceivedMail[]> {
  const response = await fetch(`${need('INBOX_URL')}/messages?to=${encodeURIComponent(address)}`);
  if (!response.ok) throw new Error(`The inbox answered ${response.status}.`);
  return await response.json() as ReceivedMail[];
}

/** The newest mail to the address, once as many have come as are expected. */
export async function awaitMail(address: string, count = 1, seconds = 20): Promise<ReceivedMail> {
  for (const deadline = Date.now() + seconds * 1000; Date.now() < deadline;) {
    const mails = await listInbox(address);
    if (mails.length > count) throw new Error(`${mails.length} mails came to ${address}; ${count} were expected.`);
    if (mails[0] && mails.length === count) return mails[0];
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  throw new Error(`No ${count}. mail came to ${address} within ${seconds} s.`);
}

/** The token in the link of a mail, which stands the same in both its parts. */
export function tokenIn({ text, html }: ReceivedMail): string {
  const [inText, inHtml] = [text, html ?? ''].map((part) => /[?&]token=([A-Za-z0-9_-]+)/.exec(part)?.[1]);
  if (inText === undefined || inText !== inHtml) throw new Error('The two parts of the mail hold no common token.');
  return inText;
}
