// Loaded before the web server (node --import): Next hands route handlers no socket, and passes X-Forwarded-For on as
// sent, so the peer of each connection is written into a header of our own, over whatever the client put there. An
// address that cannot be decoded is answered here: Next would call it a fault of its own.
import http from 'node:http';

/** @param {string} address of its path: a query is read leniently */
function isDecodable(address) {
  try {
    decodeURIComponent(address.split('?', 1)[0] ?? '');
    return true;
  } catch {
    return false;
  }
}

const unreadable = JSON.stringify({
  type: '/docs/problems#bad-request', title: 'The request cannot be read', status: 400, errors: [],
  detail: 'The address is not percent-encoded UTF-8.',
});

const emit = http.Server.prototype.emit;
http.Server.prototype.emit = function emitWithPeer(event, ...details) {
  if (event === 'request') {
    const [request, response] = details;
    if (!isDecodable(request.url)) {
      response.writeHead(400, { 'content-type': 'application/problem+json' }).end(unreadable);
      return true;
    }
    request.headers['x-fourfold-peer'] = (request.socket.remoteAddress ?? 'unknown').replace(/^::ffff:/, '');
  }
  return emit.call(this, event, ...details);
};
