import type { ArrayReader } from './array-reader';

export interface AppendedArray {
  offset: number;
  /** Begins to read the array. */
  open(): ArrayReader;
  fail(found: string, expected: string): never;
}

export interface AppendedData {
  push(bytes: Buffer): Promise<void>;
  /** Whether all arrays were read. */
  isDone(): boolean;
  /** Rejects what ends before the arrays do, or before the file should. */
  end(): void;
  drop(): void;
}

const underscore = 0x5f;
const tailBytes = 256;

/**
 * Arrays that stand one after another behind all tags, each where its offset says, counted from after an underscore; what is
 * between those given is passed over.
 */
export function createAppendedData(given: readonly AppendedArray[], fail: (found: string, expected: string) => never): AppendedData {
  const arrays = [...given].sort((a, b) => a.offset - b.offset);
  let position = -1;
  let current = 0;
  let reader: ArrayReader | null = null;
  let tail: Buffer = Buffer.alloc(0);

  const begin = (bytes: Buffer): number => {
    for (const [at, byte] of bytes.entries()) {
      if (byte === underscore) {
        position = 0;
        return at + 1;
      }
      if (byte > 32) fail(`“${String.fromCodePoint(byte)}” at the beginning of AppendedData`, 'an underscore');
    }
    return bytes.length;
  };

  const readSome = async (array: AppendedArray, bytes: Buffer, from: number): Promise<number> => {
    if (reader === null && array.offset < position) array.fail('an offset within the array before it', 'arrays apart from each other');
    const ahead = Math.min(Math.max(0, array.offset - position), bytes.length - from);
    const start = from + ahead;
    position += ahead;
    if (start === bytes.length) return start;
    reader ??= array.open();
    const next = arrays[current + 1]?.offset ?? Infinity;
    const stop = Math.min(bytes.length, start + (next - position));
    await reader.push(bytes, start, stop, () => 1);
    position += stop - start;
    if (reader.isDone() || position >= next) {
      await reader.end();
      reader = null;
      current += 1;
    }
    return stop;
  };

  return {
    async push(bytes) {
      tail = Buffer.concat([tail, bytes.subarray(-tailBytes)]).subarray(-tailBytes);
      let at = position < 0 ? begin(bytes) : 0;
      for (let array = arrays[current]; array !== undefined && at < bytes.length; array = arrays[current]) at = await readSome(array, bytes, at);
    },
    isDone: () => current === arrays.length,
    end() {
      arrays[current]?.fail(`the end after ${Math.max(0, position)} bytes of AppendedData`, 'all of its data');
      if (!/<\/AppendedData>\s*<\/VTKFile>\s*$/.test(tail.toString('latin1'))) fail('the end of the file', '</AppendedData> and </VTKFile>');
    },
    drop: () => reader?.drop(),
  };
}
