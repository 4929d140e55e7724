import fs from 'node:fs';
import path from 'node:path';
import { randomBytes } from 'node:crypto';
import { simpleParser } from 'mailparser';

/** @typedef {{ id: string, receivedAt: string, from: string, to: string[], subject: string, messageId: string | null,
 *   text: string, html: string | null, source: string }} Message */

/**
 * Messages on disk: what came over the wire, and who it was for, which the headers need not say.
 * @param {string} folder
 */
export function createMailStore(folder) {
  fs.mkdirSync(folder, { recursive: true });

  /** @param {string} id @returns {Promise<Message | null>} */
  async function find(id) {
    if (!/^[0-9a-z-]+$/.test(id)) return null;
    const file = path.join(folder, `${id}.json`);
    if (!fs.existsSync(file)) return null;
    const envelope = JSON.parse(fs.readFileSync(file, 'utf8'));
    const source = fs.readFileSync(path.join(folder, `${id}.eml`), 'utf8');
    const mail = await simpleParser(source);
    return {
      id,
      ...envelope,
      subject: mail.subject ?? '(no subject)',
      messageId: mail.messageId ?? null,
      text: mail.text ?? '',
      html: mail.html || null,
      source,
    };
  }

  return {
    find,
    /** @param {Buffer} source @param {string} from @param {string[]} to */
    keep(source, from, to) {
      const receivedAt = new Date().toISOString();
      const id = `${receivedAt.replace(/[^0-9]/g, '')}-${randomBytes(4).toString('hex')}`;
      fs.writeFileSync(path.join(folder, `${id}.eml`), source);
      // The envelope comes second and by a rename, so a listed message is always whole.
      const unfinished = path.join(folder, `${id}.unfinished`);
      fs.writeFileSync(unfinished, JSON.stringify({ receivedAt, from, to }));
      fs.renameSync(unfinished, path.join(folder, `${id}.json`));
    },
    /** Newest first. @param {string | null} to only messages for this address @returns {Promise<Message[]>} */
    async list(to) {
      const names = fs.readdirSync(folder).filter((name) => name.endsWith('.json'));
      const ids = names.map((name) => name.slice(0, -'.json'.length)).sort().reverse();
      const messages = await Promise.all(ids.map(find));
      return messages.filter((message) => message !== null && (to === null || message.to.includes(to)));
    },
  };
}
