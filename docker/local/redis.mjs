import fs from 'node:fs';
import net from 'node:net';

/** @param {number} port @returns {Promise<boolean>} whether the server answers PING; while it loads its data it does not */
function answersPing(port) {
  return new Promise((resolve) => {
    const socket = net.connect({ port, host: '127.0.0.1' });
    const finish = (/** @type {boolean} */ answer) => {
      socket.destroy();
      resolve(answer);
    };
    socket.setTimeout(1000, () => finish(false));
    socket.once('connect', () => socket.write('PING\r\n'));
    socket.once('data', (data) => finish(data.toString().startsWith('+PONG')));
    socket.once('error', () => finish(false));
  });
}

/** @param {{ folder: string, port: number }} options @returns {import('./supervisor.mjs').Service} */
export function redisService({ folder, port }) {
  fs.mkdirSync(folder, { recursive: true });
  /** @type {Record<string, string>} */
  const settings = {
    '--bind': '127.0.0.1',
    '--port': String(port),
    '--dir': folder,
    '--appendonly': 'yes',
    '--appendfsync': 'everysec',
    '--maxmemory-policy': 'noeviction',
    '--save': '',
    '--loglevel': 'warning',
    '--daemonize': 'no',
  };
  return {
    name: 'redis',
    isWorthShowing: (line) => /fatal|error|failed|can't|corrupt/i.test(line) && !/overcommit/.test(line),
    line: { command: 'redis-server', args: Object.entries(settings).flat() },
    isReady: () => answersPing(port),
  };
}
