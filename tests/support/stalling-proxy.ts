import net from 'node:net';
import type { AddressInfo } from 'node:net';

export interface StallingProxy {
  url: string;
  /** From now on each connection carries so many bytes from the server, and then nothing more; null for all of them. */
  stallAfter(bytes: number | null): void;
  close(): void;
}

/** Hands connections on to a server, as a network does that can stop without breaking. */
export async function startStallingProxy(target: string): Promise<StallingProxy> {
  const { hostname, port } = new URL(target);
  let allowed: number | null = null;
  const open = new Set<net.Socket>();
  const server = net.createServer((client) => {
    const upstream = net.connect(Number(port), hostname);
    let carried = 0;
    for (const socket of [client, upstream]) {
      open.add(socket);
      socket.on('close', () => open.delete(socket));
      socket.on('error', () => [client, upstream].forEach((each) => each.destroy()));
    }
    client.pipe(upstream);
    upstream.on('data', (chunk) => {
      const room = allowed === null ? chunk.length : Math.max(allowed - carried, 0);
      carried += chunk.length;
      client.write(chunk.subarray(0, room));
    });
    upstream.on('end', () => {
      if (allowed === null) client.end();
    });
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return {
    url: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    stallAfter(bytes) {
      allowed = bytes;
    },
    close() {
      open.forEach((socket) => socket.destroy());
      server.close();
    },
  };
}
