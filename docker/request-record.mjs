// One record for each request, from its first byte to the close of its answer: the server fills in whose it was, and
// hears of it on a channel when it is over. Next tells neither bytes nor the end of an answer.
import { AsyncLocalStorage } from 'node:async_hooks';
import { randomUUID } from 'node:crypto';
import diagnostics from 'node:diagnostics_channel';
import http from 'node:http';

const over = diagnostics.channel('fourfold:request');
const current = new AsyncLocalStorage();
Object.assign(globalThis, { fourfoldRequest: current });

/** What a caller may name a request by; anything else could break a line of the log or hide in it. */
const wellFormed = /^[\w.-]{1,64}$/;

/** @param {http.IncomingMessage} request @param {http.ServerResponse} response */
function openRecord(request, response) {
  const given = request.headers['x-request-id'];
  const id = typeof given === 'string' && wellFormed.test(given) ? given : randomUUID();
  request.headers['x-request-id'] = id;
  response.setHeader('x-request-id', id);
  const { socket } = request;
  const writtenBefore = socket.bytesWritten;
  const begun = performance.now();
  const record = { id, method: request.method ?? '', path: (request.url ?? '').split('?', 1)[0] ?? '', received: 0, sent: 0, status: 0, milliseconds: 0, isCut: false };
  const push = request.push;
  request.push = function pushCounted(chunk, ...rest) {
    if (chunk) record.received += chunk.length;
    return push.call(this, chunk, ...rest);
  };
  response.once('close', () => {
    record.status = response.statusCode;
    record.milliseconds = Math.round((performance.now() - begun) * 10) / 10;
    record.sent = socket.bytesWritten - writtenBefore;
    record.isCut = !response.writableFinished;
    over.publish(record);
  });
  return record;
}

const emit = http.Server.prototype.emit;
http.Server.prototype.emit = function emitRecorded(event, ...details) {
  if (event !== 'request') return emit.call(this, event, ...details);
  return current.run(openRecord(details[0], details[1]), () => emit.call(this, event, ...details));
};
