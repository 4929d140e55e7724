// AssemblyScript. A number of a row into its column.
import { allDigits, commaMark, convert, convertLong, digitCount, digitsAt, mantissa, pointMark, wholePowers } from './decimal';
import { allowComma, capacity, delimiter, fileMark, keepMark, newline, row, Slot } from './row-state';

/** Whether the number that stood in this column last stands at `from` again, and something ends it. */
@inline
export function isRepeated(slot: Slot, from: usize): bool {
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

/** Notes the digits of a number that has more than any before it in its column. */
function noteDigits(slot: Slot, digits: u64, from: usize, to: usize): void {
  if (digits != allDigits) {
    while (slot.limit <= digits && slot.limit != allDigits) slot.limit *= 10;
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

/**
 * Reads the number at `from` into its column: digits, a mark, an exponent with E or D. The byte after it, or 0 where it does
 * not begin as a number, or is one that only the language's own conversion decides.
 */
export function readNumber(slot: Slot, from: usize): usize {
  const target = slot.values + (<usize>row << 3);
  if (isRepeated(slot, from)) {
    const last = slot.values + (<usize>(row > 0 ? row : capacity) << 3) - 8;
    store<f64>(target, load<f64>(last));
    return from + slot.length;
  }
  let byte = <u32>load<u8>(from);
  const isNegative = byte == 45;
  const first = isNegative || byte == 43 ? from + 1 : from;
  let digits: u64 = 0;
  let at = first;
  let digit = <u32>load<u8>(at) - 48;
  while (digit <= 9) {
    digits = digits * 10 + digit;
    at += 1;
    digit = <u32>load<u8>(at) - 48;
  }
  let written = at - first;
  let fraction: u32 = 0;
  let mark: u32 = 0;
  byte = digit + 48;
  if (byte == 46 || (byte == 44 && allowComma)) {
    mark = byte == 46 ? pointMark : commaMark;
    at += 1;
    const start = at;
    let count = digitCount(at);
    while (count == 8) {
      digits = digits * 100_000_000 + digitsAt(at, 8);
      at += 8;
      count = digitCount(at);
    }
    if (count != 0) digits = digits * load<u64>(wholePowers + (<usize>count << 3)) + digitsAt(at, count);
    at += count;
    fraction = at - start;
    written += fraction;
  }
  if (written == 0) return 0;
  if (mark != fileMark && mark != 0 && !keepMark(mark)) return 0;
  const to = at;
  byte = load<u8>(at);
  let power: i32 = 0;
  const letter = byte | 32;
  if (letter == 101 || letter == 100) {
    at += 1;
    byte = <u32>load<u8>(at);
    const isBelow = byte == 45;
    if (isBelow || byte == 43) at += 1;
    const start = at;
    let digit = <u32>load<u8>(at) - 48;
    while (digit <= 9 && at - start < 5) {
      power = power * 10 + digit;
      at += 1;
      digit = <u32>load<u8>(at) - 48;
    }
    if (at == start || digit <= 9) return 0;
    if (isBelow) power = -power;
  }
  let size: f64;
  if (written > 19) {
    size = convertLong(first, to, power);
    digits = mantissa;
  } else size = convert(digits, power - <i32>fraction);
  if (size != size) return 0;
  store<f64>(target, isNegative ? -size : size);
  if (digits >= slot.limit) noteDigits(slot, digits, from, at);
  slot.before = from;
  slot.length = at - from;
  return at;
}
