import 'server-only';
import { drainSignal } from './request-record';

const heartbeatMilliseconds = 15_000;
/** What a page waits before it asks again, when this process ends and another is there. */
const comeBackMilliseconds = 500;

/** What waits for a reader who does not take it; beyond, the stream ends and the page, if it lives, comes again. */
const mostWaiting = 256 * 1024;

type Send = (event: string, data: string) => void;

/**
 * A stream of server-sent events: what was already known, then what is sent until the reader goes or `end` is called. A
 * comment now and then keeps proxies from closing it; `stop` is called once, when it ends.
 */
export function eventStream(signal: AbortSignal, headers: Headers, begin: (send: Send, end: () => void) => Promise<() => void>): Promise<Response> {
  const encoder = new TextEncoder();
  let stream: ReadableStreamDefaultController<Uint8Array> | null = null;
  let early: Uint8Array[] = [];
  let dropReader = (): void => undefined;
  const ended = new AbortController();
  const isLeft = AbortSignal.any([signal, ended.signal]);
  const write = (text: string) => {
    const bytes = encoder.encode(text);
    if (!stream) early.push(bytes);
    else if ((stream.desiredSize ?? 0) > 0) stream.enqueue(bytes);
    else dropReader();
  };

  const draining = drainSignal();
  return begin((event, data) => write(`event: ${event}\ndata: ${data}\n\n`), () => ended.abort()).then((stop) => {
    const heartbeat = setInterval(() => write(': still here\n\n'), heartbeatMilliseconds);
    let isOver = false;
    const end = () => {
      if (isOver) return;
      isOver = true;
      clearInterval(heartbeat);
      isLeft.removeEventListener('abort', leave);
      draining.removeEventListener('abort', takeLeave);
      stream = null;
      early = [];
      stop();
    };
    dropReader = () => {
      const slow = stream;
      end();
      slow?.error(new Error('The reader of the events does not take them.'));
    };
    function leave(): void {
      const ending = stream;
      end();
      ending?.close();
    }
    function takeLeave(): void {
      write(`retry: ${comeBackMilliseconds}\n\n`);
      leave();
    }
    const body = new ReadableStream<Uint8Array>({
      start(controller) {
        stream = controller;
        for (const bytes of early.splice(0)) controller.enqueue(bytes);
        // Gone or ending since before the listening began: no event will say so again.
        if (isLeft.aborted) leave();
        else if (draining.aborted) takeLeave();
        isLeft.addEventListener('abort', leave);
        draining.addEventListener('abort', takeLeave);
      },
      cancel: end,
    }, new ByteLengthQueuingStrategy({ highWaterMark: mostWaiting }));
    headers.set('content-type', 'text/event-stream; charset=utf-8');
    headers.set('cache-control', 'no-store, no-transform');
    headers.set('x-accel-buffering', 'no');
    return new Response(body, { status: 200, headers });
  });
}
