import type { Readable } from 'node:stream';

interface Options {
  open: (signal: AbortSignal) => Promise<Readable>;
  stallSeconds: number;
  /** Told at every piece that comes. */
  onPiece: () => void;
}

/**
 * The bytes of a file in storage. Throws where storage sends nothing for a while, so that the reading is tried again
 * instead of waiting without end.
 */
export async function* steadySource({ open, stallSeconds, onPiece }: Options): AsyncGenerator<Uint8Array> {
  const abort = new AbortController();
  let bytes = 0;
  let late: NodeJS.Timeout | undefined;
  const stalled = new Promise<never>((_resolve, reject) => {
    abort.signal.addEventListener('abort', () => reject(abort.signal.reason as Error));
  });
  // Heard below, or by nobody where the reader ended before it.
  stalled.catch(() => undefined);
  const within = <T>(work: Promise<T>): Promise<T> => {
    late = setTimeout(() => abort.abort(new Error(`Storage sent nothing for ${stallSeconds} s after ${bytes} bytes of the file.`)), stallSeconds * 1000);
    return Promise.race([work, stalled]).finally(() => clearTimeout(late));
  };
  let source: Readable | undefined;
  try {
    source = await within(open(abort.signal));
    const pieces = source[Symbol.asyncIterator]() as AsyncIterator<Uint8Array>;
    for (let next = await within(pieces.next()); next.done !== true; next = await within(pieces.next())) {
      bytes += next.value.length;
      onPiece();
      yield next.value;
    }
  } finally {
    source?.destroy();
  }
}
