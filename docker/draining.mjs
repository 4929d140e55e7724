// How the web server ends: it says so (ready answers 503, answers close their connections, event streams end with a
// hint to come back), then takes no more connections, lets what is in flight finish, and only then ends. Next by itself
// would wait for open event streams without end.
import http from 'node:http';

process.env.NEXT_MANUAL_SIG_HANDLE = 'true';

/** So that whoever spreads the load sees it first: connections kept alive are given back before they are cut. */
const noticeMilliseconds = 1000;
const finishMilliseconds = Number(process.env.DRAIN_SECONDS || 8) * 1000;

const draining = new AbortController();
Object.assign(globalThis, { fourfoldDraining: draining.signal });
/** @type {Set<http.Server>} */
const servers = new Set();

const emit = http.Server.prototype.emit;
http.Server.prototype.emit = function emitDraining(event, ...details) {
  if (event === 'listening') servers.add(this);
  if (event === 'request' && draining.signal.aborted) details[1].setHeader('connection', 'close');
  return emit.call(this, event, ...details);
};

/** @param {http.Server} server */
const connectionsOf = (server) =>
  /** @type {Promise<number>} */ (new Promise((resolve) => server.getConnections((error, count) => resolve(error ? 0 : count))));

/** @param {http.Server} server */
function close(server) {
  return /** @type {Promise<void>} */ (
    new Promise((resolve) => {
      server.close(() => resolve());
      setInterval(() => server.closeIdleConnections(), 50).unref();
      setTimeout(() => server.closeAllConnections(), finishMilliseconds).unref();
    })
  );
}

async function drain() {
  if (draining.signal.aborted) return;
  draining.abort();
  const open = await Promise.all([...servers].map(connectionsOf));
  if (open.some((count) => count > 0)) await new Promise((resolve) => setTimeout(resolve, noticeMilliseconds));
  await Promise.all([...servers].map(close));
  process.exit(0);
}

process.on('SIGTERM', () => void drain());
process.on('SIGINT', () => void drain());
