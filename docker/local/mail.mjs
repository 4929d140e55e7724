import net from 'node:net';
import path from 'node:path';
import { root } from './places.mjs';

/** @param {number} port @returns {Promise<boolean>} whether the mail server greets */
function greets(port) {
  return new Promise((resolve) => {
    const socket = net.connect({ port, host: '127.0.0.1' });
    const finish = (/** @type {boolean} */ answer) => {
      socket.end('QUIT\r\n');
      resolve(answer);
    };
    socket.setTimeout(1000, () => finish(false));
    socket.once('data', (data) => finish(data.toString().startsWith('220')));
    socket.once('error', () => resolve(false));
  });
}

/**
 * @param {{ folder: string, smtpPort: number, inboxPort: number }} options
 * @returns {import('./supervisor.mjs').Service}
 */
export function mailService({ folder, smtpPort, inboxPort }) {
  const script = path.join(root, 'docker/local/mail-server.mjs');
  return {
    name: 'mail',
    line: { command: process.execPath, args: [script, folder, String(smtpPort), String(inboxPort)] },
    isReady: () => greets(smtpPort),
  };
}
