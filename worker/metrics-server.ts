import { createHash, timingSafeEqual } from 'node:crypto';
import http from 'node:http';
import type { Registry } from 'prom-client';
import type { Logger } from '@/lib/platform/logger';

interface Serving { port: number; token: string | undefined; log: Logger }

const digest = (text: string) => createHash('sha256').update(text).digest();

/** Serves the numbers of this process: to the machine itself, or with a token to whoever sends it. The function returned ends it. */
export function serveMetrics(registry: Registry, { port, token, log }: Serving): () => void {
  const isAllowed = (request: http.IncomingMessage) =>
    token === undefined || timingSafeEqual(digest(request.headers.authorization ?? ''), digest(`Bearer ${token}`));
  const answer = async (request: http.IncomingMessage, response: http.ServerResponse) => {
    if (request.method !== 'GET' || request.url !== '/metrics' || !isAllowed(request)) {
      response.writeHead(404).end();
      return;
    }
    const text = await registry.metrics();
    response.writeHead(200, { 'content-type': registry.contentType }).end(text);
  };
  const server = http.createServer((request, response) => {
    answer(request, response).catch((error: unknown) => {
      log.error({ err: error }, 'metrics not served');
      response.destroy();
    });
  });
  // A port that is taken must not stop the work.
  server.on('error', (error) => log.error({ err: error, port }, 'metrics not served'));
  server.listen(port, token === undefined ? '127.0.0.1' : '0.0.0.0');
  return () => {
    server.close();
    server.closeAllConnections();
  };
}
