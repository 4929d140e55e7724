import { openTemporaryFile, type TemporaryFile } from './temporary-file';
import type { ColumnBatch } from './source';

const batchRows = 2048;
const shortestBlock = 16;
const longestBlock = 8192;
const bytesEach = 8;
/** 32 MiB; what is more waits on disk. */
const usuallyHeld = 4 * 1024 * 1024;
/** 16 MiB beside it for the ends of columns, so that those which begin once memory is full go to disk in large blocks too. */
const mostInTails = 2 * 1024 * 1024;

/** A column of doubles that grows. */
export interface StoredColumn {
  add(value: number): void;
  /** Adds the first `count` of the values. */
  addAll(values: Float64Array, count: number): void;
  length(): number;
  /** Copies `count` values from the row `from` to the beginning of `into`. Throws RangeError where there are not so many. */
  copy(from: number, count: number, into: Float64Array): void;
}

export interface ColumnStore {
  /** Any number of columns may grow at once, in any order. */
  addColumn(): StoredColumn;
  /** Frees the memory and the disk; nothing can be read after it. */
  close(): void;
}

/** What the columns of a store share. */
interface Room {
  /** Takes memory for so many numbers, or says that there is none. */
  take(values: number): boolean;
  /** The same for the growing end of a column, also where no memory is left for blocks. */
  takeForTail(values: number): boolean;
  file(): TemporaryFile;
}

/**
 * Holds columns of unknown length, about `mostHeld` numbers of all of them in memory and the others in a temporary file;
 * it must be closed. Throws RejectedFile where a file takes more room than one may.
 */
export function createColumnStore(mostHeld = usuallyHeld): ColumnStore {
  let held = 0;
  let inTails = 0;
  let file: TemporaryFile | null = null;
  const take = (values: number): boolean => {
    if (held + values > mostHeld) return false;
    held += values;
    return true;
  };
  const room: Room = {
    take,
    takeForTail(values) {
      if (take(values)) return true;
      if (inTails + values > mostInTails) return false;
      inTails += values;
      return true;
    },
    file: () => (file ??= openTemporaryFile()),
  };
  return { addColumn: () => createStoredColumn(room), close: () => file?.close() };
}

function createStoredColumn(room: Room): StoredColumn {
  // The row at which each block begins, and where it lies: in memory, or at a position of the file.
  const starts: number[] = [];
  const places: (Float64Array | number)[] = [];
  // The rows after those of all blocks.
  let tail = new Float64Array(shortestBlock);
  let before = 0;
  let filled = 0;

  /** The tail is full: it grows, stays as a block in memory, or goes to disk. */
  const extend = () => {
    const isWhole = tail.length === longestBlock;
    if (!isWhole && room.takeForTail(tail.length)) {
      const longer = new Float64Array(tail.length * 2);
      longer.set(tail);
      tail = longer;
      return;
    }
    const isHeld = isWhole && room.take(tail.length);
    starts.push(before);
    places.push(isHeld ? tail : room.file().append(bytesOf(tail)));
    if (isHeld) tail = new Float64Array(longestBlock);
    before += filled;
    filled = 0;
  };

  const blockOf = (row: number): number => {
    let [low, high] = [0, starts.length - 1];
    while (low < high) {
      const middle = (low + high + 1) >> 1;
      if ((starts[middle] as number) <= row) low = middle;
      else high = middle - 1;
    }
    return low;
  };

  /** Copies what lies together and returns how much it was. */
  const copySome = (row: number, into: Float64Array): number => {
    if (row >= before) {
      into.set(tail.subarray(row - before, row - before + into.length));
      return into.length;
    }
    const block = blockOf(row);
    const place = places[block] as Float64Array | number;
    const start = starts[block] as number;
    const some = into.subarray(0, Math.min(into.length, (starts[block + 1] ?? before) - row));
    if (typeof place === 'number') room.file().read(bytesOf(some), place + (row - start) * bytesEach);
    else some.set(place.subarray(row - start, row - start + some.length));
    return some.length;
  };

  return {
    add(value) {
      if (filled === tail.length) extend();
      tail[filled] = value;
      filled += 1;
    },
    addAll(values, count) {
      for (let at = 0; at < count;) {
        if (filled === tail.length) extend();
        const some = Math.min(count - at, tail.length - filled);
        tail.set(values.subarray(at, at + some), filled);
        filled += some;
        at += some;
      }
    },
    length: () => before + filled,
    copy(from, count, into) {
      if (from < 0 || from + count > before + filled) throw new RangeError(`Rows ${from} to ${from + count} of a column of ${before + filled} were asked for.`);
      for (let at = 0; at < count;) at += copySome(from + at, into.subarray(at, count));
    },
  };
}

/** The first `rows` of columns as batches, in the order given. The arrays of a batch are used again for the next. */
export function deliverColumns(columns: readonly StoredColumn[], rows: number, onBatch: (batch: ColumnBatch) => void): void {
  const batch = columns.map(() => new Float64Array(batchRows));
  for (let from = 0; from < rows; from += batchRows) {
    const count = Math.min(batchRows, rows - from);
    for (const [slot, column] of columns.entries()) column.copy(from, count, batch[slot] as Float64Array);
    onBatch({ rows: count, columns: batch, lines: null });
  }
}

const bytesOf = (values: Float64Array): Uint8Array => new Uint8Array(values.buffer, values.byteOffset, values.byteLength);
