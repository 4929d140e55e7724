import http from 'node:http';
import { SMTPServer } from 'smtp-server';
import { listPage, messagePage } from './mail-pages.mjs';
import { createMailStore } from './mail-store.mjs';

const [folder, smtpPort, inboxPort, host = '127.0.0.1'] = process.argv.slice(2);
if (!folder || !smtpPort || !inboxPort) throw new Error('Expected a folder, a mail port and a page port.');
const store = createMailStore(folder);

const smtp = new SMTPServer({
  disabledCommands: ['STARTTLS'],
  authOptional: true,
  allowInsecureAuth: true,
  onAuth: (auth, _session, done) => done(null, { user: auth.username }),
  onData(stream, session, done) {
    /** @type {Buffer[]} */
    const chunks = [];
    stream.on('data', (chunk) => chunks.push(chunk));
    stream.on('error', done);
    stream.on('end', () => {
      const { mailFrom, rcptTo } = session.envelope;
      try {
        store.keep(
          Buffer.concat(chunks),
          mailFrom ? mailFrom.address : '',
          rcptTo.map(({ address }) => address),
        );
        done();
      } catch (error) {
        done(error instanceof Error ? error : new Error(String(error)));
      }
    });
  },
});
smtp.on('error', (error) => console.error(`Mail: ${error.message}`));

const HTML = { 'Content-Type': 'text/html; charset=utf-8' };
// A message is a stranger's page: no scripts, nothing fetched.
const MESSAGE_POLICY = "sandbox; default-src 'none'; style-src 'unsafe-inline'; img-src data:";

/** @param {URL} url @returns {Promise<[number, Record<string, string>, string]>} */
async function answer(url) {
  const json = (/** @type {unknown} */ value) => JSON.stringify(value);
  const JSON_TYPE = { 'Content-Type': 'application/json' };
  if (url.pathname === '/') return [200, HTML, listPage(await store.list(null))];
  if (url.pathname === '/messages') return [200, JSON_TYPE, json(await store.list(url.searchParams.get('to')))];
  const [, kind, id, part] = url.pathname.split('/');
  const message = id === undefined ? null : await store.find(id);
  if (message && kind === 'messages' && part === undefined) return [200, JSON_TYPE, json(message)];
  if (message && kind === 'message') {
    if (part === undefined) return [200, HTML, messagePage(message)];
    if (part === 'source') return [200, { 'Content-Type': 'text/plain; charset=utf-8' }, message.source];
    if (part === 'html' && message.html !== null) {
      return [200, { ...HTML, 'Content-Security-Policy': MESSAGE_POLICY }, message.html];
    }
  }
  return [404, { 'Content-Type': 'text/plain' }, 'There is no such message.'];
}

const inbox = http.createServer((request, response) => {
  answer(new URL(request.url ?? '/', 'http://inbox'))
    .then(([status, headers, body]) => response.writeHead(status, headers).end(body))
    .catch((error) => {
      console.error(error);
      response.writeHead(500).end('The inbox could not be read.');
    });
});

smtp.listen(Number(smtpPort), host);
inbox.listen(Number(inboxPort), host);
process.once('SIGTERM', () => process.exit(0));
