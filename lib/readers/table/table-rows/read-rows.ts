// AssemblyScript. Rows of a text table in memory to columns of doubles.
import { readPlainRows } from './plain-rows';
import { readNumber } from './read-number';
import {
  allowComma, at, begin, capacity, delimiter, describe, expectPlain, fields, fileMark, forget, freeFrom, goOn, isSpaced, line, lines, markLine, moveTo,
  newline, place, plainRows, row, rowStart, Slot, stopAt, width,
} from './row-state';

export { at, begin, describe, fileMark, freeFrom, goOn, line, markLine, place, row, rowStart };

export const ended: u32 = 0;
export const full: u32 = 1;
export const stopped: u32 = 2;

@inline
function isBlank(byte: u32): bool {
  return (byte == 32 || byte == 9 || byte == 13) && byte != newline && (isSpaced || byte != delimiter);
}

@inline
function skipBlanks(from: usize): usize {
  while (isBlank(load<u8>(from))) from += 1;
  return from;
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
    if (plainRows > 0 && line >= skipped) {
      const before = row;
      readPlainRows(end);
      if (at == end) return ended;
      // Where most rows are of another kind, only those are looked for.
      expectPlain(min(plainRows + <i32>(row - before) - 2, 1000));
      if (row != capacity) forget();
    }
    if (row == capacity) return full;
    const number = line + 1;
    const start = at;
    const first = <u32>load<u8>(start);
    if (number <= skipped || ((first <= 47 && first != 45 && first != 46) && !isRow(start))) {
      moveTo(afterLine(start), row, number);
      continue;
    }
    moveTo(start, row, number);
    const after = readRow(start);
    if (after == 0) {
      stopAt(start);
      moveTo(afterLine(start), row, number);
      forget();
      return stopped;
    }
    store<f64>(lines + (<usize>row << 3), number);
    moveTo(after, row + 1, number);
  }
  return ended;
}
