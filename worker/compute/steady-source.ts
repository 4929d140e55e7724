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
  // A promise of its own for each piece: a race against one that lasts would keep every piece for as long.
  const within = <T>(work: Promise<T>): Promise<T> => new Promise((resolve, reject) => {
    const late = setTimeout(() => {
      const error = new Error(`Storage sent nothing for ${stallSeconds} s after ${bytes} bytes of the file.`);
      reject(error);
      abort.abort(error);
    }, stallSeconds * 1000);
    work.then(resolve, reject).finally(() => clearTimeout(late));
  });
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
