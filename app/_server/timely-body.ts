import 'server-only';
import { AppError } from '@/lib/errors';

export interface BodyPace {
  /** Over each such stretch at least `leastBytes` must come, or the end. */
  seconds: number;
  leastBytes: number;
  /** The whole body must be there within this, where it is given. */
  wholeSeconds?: number;
}

const files: Omit<BodyPace, 'seconds'> = { leastBytes: 32 * 1024 };

/** A file may take as long as it keeps coming. */
export const paceOfFiles = (seconds: number): BodyPace => ({ seconds, ...files });
/** A body of JSON is small and comes at once. */
export const paceOfJson = (seconds: number): BodyPace => ({ seconds, leastBytes: 1, wholeSeconds: 2 * seconds });

function tooSlow(bytes: number, { seconds, leastBytes, wholeSeconds }: BodyPace): AppError {
  const expected = wholeSeconds === undefined
    ? `at least ${leastBytes / 1024} KiB in every ${seconds} s`
    : `something in every ${seconds} s and the whole within ${wholeSeconds} s`;
  return new AppError('too-slow', `The body came too slowly: ${bytes} bytes arrived, then too few. Expected ${expected}. Nothing was kept; send it again.`);
}

/**
 * The chunks of a body, or 408 where they come too slowly. Only the sender's time counts, not what the caller takes between
 * two chunks.
 */
export async function* timelyBody(body: AsyncIterable<Uint8Array>, pace: BodyPace): AsyncGenerator<Uint8Array> {
  const iterator = body[Symbol.asyncIterator]();
  const stretch = pace.seconds * 1000;
  let [bytes, since, waited, waitedInAll] = [0, 0, 0, 0];
  try {
    for (;;) {
      const begun = performance.now();
      const left = Math.min(stretch - waited, (pace.wholeSeconds ?? Infinity) * 1000 - waitedInAll);
      let timer: NodeJS.Timeout | undefined;
      const late = new Promise<'late'>((resolve) => { timer = setTimeout(resolve, Math.max(left, 0), 'late'); });
      const next = await Promise.race([iterator.next(), late]).finally(() => clearTimeout(timer));
      const took = performance.now() - begun;
      waited += took;
      waitedInAll += took;
      if (next === 'late') throw tooSlow(bytes, pace);
      if (next.done === true) return;
      bytes += next.value.length;
      since += next.value.length;
      if (since >= pace.leastBytes) [since, waited] = [0, 0];
      yield next.value;
    }
  } finally {
    // Not awaited: a sender who says nothing would keep it from ever ending.
    void iterator.return?.().catch(() => undefined);
  }
}
