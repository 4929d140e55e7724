import { setTimeout as pause } from 'node:timers/promises';

/**
 * Whether whoever spreads the load may ask the next: nothing was sent yet, or a connection kept from before was closed just
 * as a GET was sent on it, which RFC 9110 (9.2.2) lets a client send again.
 */
function maySendAgain(error: unknown, { method = 'GET' }: RequestInit): boolean {
  const cause = error instanceof Error ? (error.cause as { code?: string } | undefined) : undefined;
  return cause?.code === 'ECONNREFUSED' || (method === 'GET' && ['ECONNRESET', 'UND_ERR_SOCKET'].includes(cause?.code ?? ''));
}

export interface Balanced {
  /** `init` is made anew for every try, since a body that streams can be sent once. */
  fetch(path: string, init: () => RequestInit): Promise<Response>;
  /** Reads a stream of server-sent events until told to stop, coming back each time it ends, as a browser does. */
  listen(path: string, init: RequestInit): { events: string[]; endings: string[]; stop: () => Promise<void> };
}

/** Sends each request to the next of several web processes, and past one that takes no connections: what a load balancer does. */
export function createBalanced(addresses: string[]): Balanced {
  let turn = 0;
  const ask = async (path: string, init: () => RequestInit): Promise<Response> => {
    for (let tries = 1; ; tries += 1) {
      turn += 1;
      const request = init();
      try {
        return await fetch(`${addresses[turn % addresses.length] ?? ''}${path}`, request);
      } catch (error) {
        if (!maySendAgain(error, request) || tries > 2 * addresses.length) throw error;
      }
    }
  };

  return {
    fetch: ask,
    listen(path, init) {
      const abort = new AbortController();
      const events: string[] = [];
      const endings: string[] = [];
      const once = async () => {
        const response = await ask(path, () => ({ ...init, signal: abort.signal }));
        if (response.status !== 200 || !response.body) throw new Error(`Events answered ${response.status}.`);
        let text = '';
        const reader = response.body.pipeThrough(new TextDecoderStream()).getReader();
        for (let read = await reader.read(); !read.done; read = await reader.read()) {
          text += read.value;
          const blocks = text.split('\n\n');
          text = blocks.pop() ?? '';
          events.push(...blocks);
        }
        const last = events.at(-1) ?? '';
        endings.push(last);
        await pause(Number(/^retry: (\d+)$/.exec(last)?.[1] ?? 3000));
      };
      const run = async () => {
        while (!abort.signal.aborted) await once();
      };
      const running = run().catch((error: unknown) => {
        if (!abort.signal.aborted) endings.push(`failed: ${String(error)}`);
      });
      return {
        events, endings,
        async stop() {
          abort.abort();
          await running;
        },
      };
    },
  };
}
