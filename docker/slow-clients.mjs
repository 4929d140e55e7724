// What a client may keep the web server waiting for. Next sets no limits of its own, and Node's are those of a server that
// nobody means harm to: whoever sends a byte now and then, or never reads an answer, would hold a connection without end.
import http from 'node:http';

const silenceSeconds = Number(process.env.BODY_SECONDS || 30);
const headersSeconds = Math.min(silenceSeconds, 15);
/** Beyond what the product itself waits for a body, so that its own answer, which says why, comes first. */
const bodySeconds = silenceSeconds * 2 + 5;
const idleReaderMilliseconds = Number(process.env.IDLE_READER_SECONDS || 60) * 1000;
/** What is still being sent after the answer is read and thrown away for so long. */
const lingerMilliseconds = 5000;

const createServer = http.createServer;
const limits = { headersTimeout: headersSeconds * 1000, requestTimeout: 0, connectionsCheckingInterval: 1000 };
http.createServer = /** @type {typeof createServer} */ (/** @param {any[]} given options, listener, or both */ (...given) => {
  const [options, listener] = typeof given[0] === 'function' ? [{}, given[0]] : given;
  return createServer({ ...limits, ...options }, listener);
});

/** A file goes on as long as it keeps coming, by a rule of the call itself. @param {http.IncomingMessage} request */
const isFile = ({ method, url = '' }) => method === 'PUT' && /\/data(?:\?|$)/.test(url);

/** @param {http.IncomingMessage} request @param {http.ServerResponse} response */
function limitBody(request, response) {
  // Held here: a request that is over may have lost it.
  const { socket } = request;
  const end = () => {
    if (!request.complete) socket.destroy();
  };
  const late = isFile(request) ? undefined : setTimeout(end, bodySeconds * 1000).unref();
  response.once('finish', () => setTimeout(end, lingerMilliseconds).unref());
  response.once('close', () => clearTimeout(late));
}

/** @typedef {{ left: number, since: number }} Standing how much had left when that last changed */
/** @type {Map<import('node:net').Socket, Standing>} */
const answering = new Map();

/** Ends connections whose client has taken nothing of what waits for it, whatever is added to it meanwhile. */
function endIdleReaders() {
  const now = performance.now();
  for (const [socket, standing] of answering) {
    // What the system took of a chunk that is not out yet shows only in the handle.
    const { _handle: handle } = /** @type {{ _handle?: { writeQueueSize?: number } | null }} */ (/** @type {unknown} */ (socket));
    const left = socket.bytesWritten - socket.writableLength - (handle?.writeQueueSize ?? 0);
    if (socket.writableLength === 0 || left !== standing.left) answering.set(socket, { left, since: now });
    else if (now - standing.since > idleReaderMilliseconds) socket.resetAndDestroy();
  }
}
setInterval(endIdleReaders, Math.min(idleReaderMilliseconds / 4, 5000)).unref();

const emit = http.Server.prototype.emit;
http.Server.prototype.emit = function emitLimited(event, ...details) {
  if (event === 'connection') {
    const [socket] = details;
    answering.set(socket, { left: 0, since: performance.now() });
    socket.once('close', () => answering.delete(socket));
  }
  if (event === 'request') limitBody(details[0], details[1]);
  return emit.call(this, event, ...details);
};
