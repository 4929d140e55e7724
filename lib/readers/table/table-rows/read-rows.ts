// AssemblyScript. Rows of a text table in memory to columns of doubles.
import { allDigits, mantissa, mark, next, placePowers, readDecimal, value } from './decimal';

/** What one column keeps while rows are read: 24 bytes. */
@unmanaged
class Slot {
  /** Its doubles, one after another. */
  values: usize;
  /** Where its last number stands, and how long that is; 0 where it must not be looked at. */
  before: usize;
  length: usize;
  /** Most digits seen, where they are more than 19. */
  long: u32;
  /** A whole number of more digits than any seen: 10 to the power of the most digits seen. */
  limit: u64;
}

const slotBytes: usize = 24;

let newline: u32 = 10;
let delimiter: u32 = 44;
let isSpaced: bool = false;
let allowComma: bool = false;
let width: u32 = 0;
let capacity: u32 = 0;
/** For every column of the file the address of its slot, 0 where nobody asked for it. */
let fields: usize = 0;
let slots: usize = 0;
let slotCount: u32 = 0;
let lines: usize = 0;

/** The file's decimal mark, 0 until a number has one. */
export let fileMark: u32 = 0;
/** The line of the number that set it. */
export let markLine: f64 = 0;
/** The line that the last call of readRows ended with. */
export let line: f64 = 0;
export let row: u32 = 0;
/** Where reading goes on; where a row stopped it, that row begins at `rowStart` and ends, with its line, before `at`. */
export let at: usize = 0;
export let rowStart: usize = 0;

export const ended: u32 = 0;
export const full: u32 = 1;
export const stopped: u32 = 2;

/** Where memory is free. */
export function freeFrom(): usize {
  return __heap_base;
}

export function describe(lineEnd: u32, separator: u32, columns: u32, takesComma: bool): void {
  newline = lineEnd;
  delimiter = separator;
  isSpaced = separator == 32;
  width = columns;
  allowComma = takesComma;
}

export function place(powersAt: usize, fieldsAt: usize, slotsAt: usize, count: u32, linesAt: usize, rows: u32): void {
  placePowers(powersAt);
  fields = fieldsAt;
  slots = slotsAt;
  slotCount = count;
  lines = linesAt;
  capacity = rows;
}

/** Begins bytes at `from`, of which `lineBefore` lines went before, in a file whose decimal mark is known or 0. */
export function begin(from: usize, lineBefore: f64, knownMark: u32): void {
  at = from;
  line = lineBefore;
  fileMark = knownMark;
  row = 0;
  forget();
}

/** Goes on after rows were taken over (0) or after a row that was read elsewhere was kept (one more). */
export function goOn(rows: u32): void {
  row = rows;
}

function forget(): void {
  for (let index: u32 = 0; index < slotCount; index += 1) changetype<Slot>(slots + <usize>index * slotBytes).length = 0;
}

@inline
function isBlank(byte: u32): bool {
  return (byte == 32 || byte == 9 || byte == 13) && byte != newline && (isSpaced || byte != delimiter);
}

@inline
function skipBlanks(from: usize): usize {
  while (isBlank(load<u8>(from))) from += 1;
  return from;
}

/** Whether the number that stood in this column last stands at `from` again, and something ends it. */
@inline
function isRepeated(slot: Slot, from: usize): bool {
  const length = slot.length;
  if (length < 8) return false;
  const before = slot.before;
  if (load<u64>(from) != load<u64>(before)) return false;
  let done: usize = 8;
  while (done + 8 <= length) {
    if (load<u64>(from + done) != load<u64>(before + done)) return false;
    done += 8;
  }
  if (load<u64>(from + length - 8) != load<u64>(before + length - 8)) return false;
  const end = <u32>load<u8>(from + length);
  return end == delimiter || end == newline || end == 13;
}

function noteDigits(slot: Slot, from: usize, to: usize): void {
  if (mantissa != allDigits) {
    while (slot.limit <= mantissa && slot.limit != allDigits) slot.limit *= 10;
    return;
  }
  // More digits than a whole number here holds: the count itself, as no power of ten.
  let count: u64 = 0;
  for (; from < to; from += 1) {
    const byte = <u32>load<u8>(from);
    if ((byte | 32) == 101 || (byte | 32) == 100) break;
    if (byte - 48 <= 9 && (count > 0 || byte != 48)) count += 1;
  }
  slot.long = max(slot.long, <u32>count);
}

/** Reads the number at `from` into its column: the byte after it, or 0 where it is not plainly one. */
@inline
function readNumber(slot: Slot, from: usize): usize {
  const target = slot.values + (<usize>row << 3);
  if (isRepeated(slot, from)) {
    const last = slot.values + (<usize>(row > 0 ? row : capacity) << 3) - 8;
    store<f64>(target, load<f64>(last));
    return from + slot.length;
  }
  if (!readDecimal(from, allowComma)) return 0;
  if (mark != fileMark && mark != 0) {
    if (fileMark != 0) return 0;
    fileMark = mark;
    markLine = line;
  }
  store<f64>(target, value);
  if (mantissa >= slot.limit) noteDigits(slot, from, next);
  slot.before = from;
  slot.length = next - from;
  return next;
}

/** Passes over a field that nobody asked for: the byte that ends it, or 0 where its quotes are not plain. */
@inline
function skipField(from: usize): usize {
  let byte = <u32>load<u8>(from);
  if (byte != 34) {
    while (byte != delimiter && byte != newline && !(isSpaced && isBlank(byte))) {
      from += 1;
      byte = load<u8>(from);
    }
    return from;
  }
  while (true) {
    from += 1;
    byte = load<u8>(from);
    if (byte == newline) return 0;
    if (byte != 34) continue;
    if (<u32>load<u8>(from + 1) != 34 || isSpaced) return from + 1;
    from += 1;
  }
}

/** Reads one row from `from`: the byte after its line end, or 0 where it is not plainly a row. */
@inline
function readRow(from: usize): usize {
  let field: u32 = 0;
  while (true) {
    const slot = changetype<Slot>(load<usize>(fields + (<usize>field << 2)));
    let byte = <u32>load<u8>(from);
    if (byte <= 32) {
      from = skipBlanks(from);
      byte = load<u8>(from);
    }
    if (changetype<usize>(slot) == 0) from = skipField(from);
    else if (byte == 34) {
      from = readNumber(slot, skipBlanks(from + 1));
      if (from != 0) from = skipBlanks(from);
      if (from != 0) from = <u32>load<u8>(from) == 34 ? from + 1 : 0;
    } else from = readNumber(slot, from);
    if (from == 0) return 0;
    field += 1;
    byte = load<u8>(from);
    if (byte != delimiter && byte != newline) {
      const end = skipBlanks(from);
      byte = load<u8>(end);
      if (byte != delimiter && byte != newline && !(isSpaced && end > from)) return 0;
      from = end;
    } else if (isSpaced) {
      from = skipBlanks(from);
      byte = load<u8>(from);
    }
    if (byte == newline) return field == width ? from + 1 : 0;
    if (!isSpaced) from += 1;
    if (field == width) {
      // A separator may end the row.
      from = skipBlanks(from);
      return <u32>load<u8>(from) == newline ? from + 1 : 0;
    }
  }
}

function afterLine(from: usize): usize {
  while (<u32>load<u8>(from) != newline) from += 1;
  return from + 1;
}

function isRow(from: usize): bool {
  let byte = <u32>load<u8>(from);
  while (byte != newline && (byte == 32 || byte == 9 || byte == 13)) {
    from += 1;
    byte = load<u8>(from);
  }
  return byte != newline && byte != 35 && byte != 37 && byte != 33 && !(byte == 47 && <u32>load<u8>(from + 1) == 47);
}

/**
 * Reads rows until the bytes end before `end`, behind a line end, until the columns are full, or until a row is not plainly
 * numbers; lines up to `skipped` are passed over.
 */
export function readRows(end: usize, skipped: f64): u32 {
  while (at < end) {
    if (row == capacity) return full;
    line += 1;
    const first = <u32>load<u8>(at);
    if (line <= skipped || ((first <= 47 && first != 45 && first != 46) && !isRow(at))) {
      at = afterLine(at);
      continue;
    }
    const after = readRow(at);
    if (after == 0) {
      rowStart = at;
      at = afterLine(at);
      forget();
      return stopped;
    }
    store<f64>(lines + (<usize>row << 3), line);
    row += 1;
    at = after;
  }
  return ended;
}
