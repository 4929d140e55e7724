import http from 'node:http';
import { Transform } from 'node:stream';
import { findFault, onFaults, untilOver } from './faults.mjs';

const agent = new http.Agent({ keepAlive: true });

/** Lets half of an answer through, then breaks it off. @param {number} length @param {() => void} breakOff */
function halved(length, breakOff) {
  let left = Math.floor(length / 2);
  return new Transform({
    transform(chunk, _encoding, done) {
      const part = chunk.subarray(0, left);
      left -= part.length;
      if (part.length > 0) this.push(part);
      if (left === 0) setTimeout(breakOff, 20);
      if (left > 0) done();
    },
  });
}

/** @param {http.ServerResponse} answer @param {number} status */
function refuse(answer, status) {
  const code = status === 507 ? 'InsufficientStorage' : 'InternalError';
  answer.writeHead(status, { 'content-type': 'application/xml' });
  answer.end(`<?xml version="1.0" encoding="UTF-8"?><Error><Code>${code}</Code><Message>Refused by the test.</Message></Error>`);
}

/** Requests to storage, which can be refused, kept waiting or answered by half. @param {import('./tcp-door.mjs').Door} door */
export function openStorageDoor({ client, service, port, target }) {
  const fault = (/** @type {import('./faults.mjs').Fault['kind']} */ kind) => findFault(client, service, kind);

  /** @param {http.IncomingMessage} request @param {http.ServerResponse} answer */
  async function forward(request, answer) {
    const failing = fault('error');
    if (failing) {
      request.resume();
      return refuse(answer, failing.status ?? 500);
    }
    // Kept waiting for good: it is the client that must not.
    if (fault('stall')) return;
    await untilOver(() => !fault('lost'));
    if (request.destroyed) return;
    const delay = fault('latency')?.delay ?? 0;
    if (delay > 0) await new Promise((resolve) => setTimeout(resolve, delay));
    // Host and all else as signed.
    const headers = { ...request.headers };
    delete headers.expect;
    delete headers.connection;
    const onward = http.request({ port: target, host: '127.0.0.1', method: request.method, path: request.url, headers, agent });
    onward.on('error', () => answer.destroy());
    answer.on('close', () => onward.destroy());
    onward.on('response', (response) => {
      response.on('error', () => answer.destroy());
      answer.writeHead(response.statusCode ?? 500, response.headers);
      const length = Number(response.headers['content-length'] ?? 0);
      if (fault('truncate') && request.method === 'GET' && length > 1) response.pipe(halved(length, () => answer.destroy())).pipe(answer);
      else response.pipe(answer);
    });
    request.pipe(onward);
  }

  const server = http.createServer((request, answer) => void forward(request, answer));
  server.on('connection', (socket) => {
    if (fault('cut')) return socket.destroy();
    const end = onFaults(() => {
      if (fault('cut')) socket.destroy();
    });
    socket.on('close', end);
  });
  server.keepAliveTimeout = 60_000;
  return new Promise((resolve) => server.listen(port, '127.0.0.1', () => resolve(undefined)));
}
