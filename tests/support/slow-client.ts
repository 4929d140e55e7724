import http from 'node:http';
import net from 'node:net';
import { setTimeout as pause } from 'node:timers/promises';
import type { Problem } from './api';

interface Slow { method: string; path: string; headers: Record<string, string>; pieces: Iterable<string | Buffer>; everyMilliseconds: number }

/** Sends the pieces of a body one by one, with a pause after each, and ends where they do; the answer as soon as it comes. */
export function sendSlowly(base: string, { method, path, headers, pieces, everyMilliseconds }: Slow): Promise<{ status: number; body: Problem }> {
  return new Promise((resolve, reject) => {
    const request = http.request(new URL(path, base), { method, headers, agent: false }, (response) => {
      let text = '';
      response.setEncoding('utf8');
      response.on('data', (chunk: string) => { text += chunk; });
      response.on('end', () => {
        resolve({ status: response.statusCode ?? 0, body: JSON.parse(text) as Problem });
        request.destroy();
      });
    });
    request.on('error', reject);
    void (async () => {
      for (const piece of pieces) {
        if (request.destroyed) return;
        request.write(piece);
        await pause(everyMilliseconds);
      }
      request.end();
    })();
  });
}

/** Opens a connection, sends this over it and goes on with it as told; resolves to the seconds after which the server ended it. */
export function untilCut(base: string, first: string, { onward = '', isReading = true }: { onward?: string; isReading?: boolean } = {}): Promise<number> {
  const { hostname, port } = new URL(base);
  const socket = net.connect(Number(port), hostname);
  const begun = performance.now();
  if (isReading) socket.resume();
  socket.write(first);
  const going = setInterval(() => socket.write(onward), 100);
  return new Promise((resolve) => {
    // An answer that ends the connection, or a reset: both are an end.
    socket.on('error', () => undefined);
    socket.on('close', () => {
      clearInterval(going);
      resolve((performance.now() - begun) / 1000);
    });
  });
}
