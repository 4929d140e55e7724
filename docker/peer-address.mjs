// Loaded before the web server (node --import): Next hands route handlers no socket, and passes X-Forwarded-For on as
// sent, so the peer of each connection is written into a header of our own, over whatever the client put there.
import http from 'node:http';

const emit = http.Server.prototype.emit;
http.Server.prototype.emit = function emitWithPeer(event, ...details) {
  if (event === 'request') {
    const [request] = details;
    request.headers['x-fourfold-peer'] = (request.socket.remoteAddress ?? 'unknown').replace(/^::ffff:/, '');
  }
  return emit.call(this, event, ...details);
};
