import net from 'node:net';

/** @typedef {'start' | 'test' | 'validate'} RunName */
/** @typedef {{ postgres: number, redis: number, storage: number, smtp: number }} NetworkPorts where one client reaches the services */
/** @typedef {{ postgres: number, redis: number, storage: number, storageObject: number, storageContainer: number,
 *   storageAccount: number, smtp: number, inbox: number, metrics: number, web: number }} Ports */

const DEFAULT_BASE = 15400;
// Tests and validation keep their distance from a running start, so one variable moves all three.
const RUN_OFFSETS = { start: 0, test: 10000, validate: 11000 };
const EPHEMERAL_START = 32768;
const HIGHEST_BASE = EPHEMERAL_START - RUN_OFFSETS.validate - 11;

const PURPOSES = {
  postgres: 'PostgreSQL',
  redis: 'Redis',
  storage: 'the object store',
  storageObject: 'the object store (object server)',
  storageContainer: 'the object store (container server)',
  storageAccount: 'the object store (account server)',
  smtp: 'the mail server',
  inbox: 'the mail inbox page',
  metrics: 'the metrics of the worker',
  web: 'the web server',
};

/** @param {string} variable @param {number} fallback @param {number} highest */
function readPort(variable, fallback, highest) {
  const text = process.env[variable];
  if (text === undefined || text === '') return fallback;
  const port = Number(text);
  if (!Number.isInteger(port) || port < 1024 || port > highest) {
    throw new Error(`${variable} is "${text}"; it must be a whole number from 1024 to ${highest}.`);
  }
  return port;
}

/** @param {RunName} name @returns {Ports} */
export function portsOf(name) {
  const base = readPort('FOURFOLD_PORT_BASE', DEFAULT_BASE, HIGHEST_BASE) + RUN_OFFSETS[name];
  return {
    postgres: base,
    redis: base + 1,
    storage: base + 2,
    storageObject: base + 3,
    storageContainer: base + 4,
    storageAccount: base + 5,
    smtp: base + 6,
    inbox: base + 7,
    metrics: base + 8,
    web: name === 'start' ? readPort('PORT', 3000, 65535) : base + 10,
  };
}

/**
 * Of a test run: the doors through which web and worker reach the services, which tests can close, and their control.
 * @returns {{ web: NetworkPorts, worker: NetworkPorts, control: number }}
 */
export function networkPorts() {
  const first = portsOf('test').web + 20;
  const doors = (/** @type {number} */ port) => ({ postgres: port, redis: port + 1, storage: port + 2, smtp: port + 3 });
  return { web: doors(first), worker: doors(first + 4), control: first + 8 };
}

/** @param {number} port @returns {Promise<boolean>} */
function isFree(port) {
  return new Promise((resolve) => {
    const server = net.createServer();
    server.once('error', () => resolve(false));
    server.listen({ port, host: '127.0.0.1', exclusive: true }, () => server.close(() => resolve(true)));
  });
}

/**
 * Refuses to start when a port is taken, naming the port, what it is for and the variable that moves it.
 * @param {RunName} name @param {Partial<Ports>} ports
 */
export async function assertPortsFree(name, ports) {
  const taken = [];
  for (const [key, port] of Object.entries(ports)) {
    if (await isFree(port)) continue;
    const variable =
      key === 'web' && name === 'start'
        ? 'set PORT to another one'
        : `set FOURFOLD_PORT_BASE to another base (${DEFAULT_BASE} unless set, at most ${HIGHEST_BASE})`;
    taken.push(`Port ${port}, for ${PURPOSES[key]}, is already in use. Stop what uses it, or ${variable}.`);
  }
  if (taken.length > 0) throw new Error(taken.join('\n'));
}
