import { createInflate, inflateSync } from 'node:zlib';

/** Blocks up to this size, packed and unpacked, are unpacked at once; larger ones piece by piece. */
const mostAtOnce = 1024 * 1024;

export interface BlockInflater {
  push(bytes: Uint8Array): Promise<void> | void;
  /** Told when all bytes of the block were pushed. Rejects where they are not a whole zlib stream. */
  end(): Promise<void> | void;
  /** Ends it early, without an answer. */
  drop(): void;
}

/** One block of a compressed array, `packed` bytes that should become `unpacked` ones, handed on as they come out. */
export function createBlockInflater({ packed, unpacked }: { packed: number; unpacked: number }, onBytes: (bytes: Uint8Array) => void): BlockInflater {
  return Math.max(packed, unpacked) <= mostAtOnce ? inflateAtOnce(packed, unpacked, onBytes) : inflateByPieces(onBytes);
}

function inflateAtOnce(packed: number, unpacked: number, onBytes: (bytes: Uint8Array) => void): BlockInflater {
  const room = Buffer.allocUnsafe(packed);
  let filled = 0;
  return {
    push(bytes) {
      room.set(bytes, filled);
      filled += bytes.length;
    },
    end() {
      if (packed > 0 || unpacked > 0) onBytes(inflateSync(room, { maxOutputLength: Math.max(1, unpacked) }));
    },
    drop: () => undefined,
  };
}

function inflateByPieces(onBytes: (bytes: Uint8Array) => void): BlockInflater {
  const inflate = createInflate({ chunkSize: 256 * 1024 });
  let fault: Error | null = null;
  let wake: (() => void) | null = null;
  const tell = (error: unknown) => {
    fault ??= error instanceof Error ? error : new Error(String(error));
    wake?.();
  };
  inflate.on('error', tell);
  inflate.on('data', (bytes: Buffer) => {
    try {
      if (fault === null) onBytes(bytes);
    } catch (error) {
      tell(error);
    }
  });
  const settle = (begin: (done: () => void) => void) => new Promise<void>((resolve, reject) => {
    const done = () => {
      wake = null;
      if (fault === null) resolve();
      else reject(fault);
    };
    wake = done;
    if (fault === null) begin(done);
    else done();
  });
  return {
    // A copy: what is pushed may be used again while it waits.
    push: (bytes) => settle((done) => inflate.write(Buffer.from(bytes), done)),
    end: () => settle((done) => inflate.end(() => undefined).once('end', done)),
    drop: () => inflate.destroy(),
  };
}
