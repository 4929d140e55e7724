// AssemblyScript. Rows of numbers alone, which are nearly all rows there are.
import { commaMark, convertPlain, digitCount, digitsAt, pointMark, wholePowers } from './decimal';
import { isRepeated } from './read-number';
import { allowComma, at, capacity, delimiter, fields, fileMark, line, lines, moveTo, newline, row, Slot, width } from './row-state';

/**
 * Reads rows of numbers with nothing but separators between them, as far as they go: the commonest rows, without a call, for
 * which all that is known would have to leave its registers. What is anything else is left to readRow.
 */
export function readPlainRows(end: usize): void {
  const separator = delimiter;
  const lineEnd = newline;
  const takesComma = allowComma;
  const knownMark = fileMark;
  const firstField = fields;
  const fieldsEnd = fields + (<usize>width << 2);
  const most = capacity;
  let from = at;
  let done = row;
  let seen = line;
  while (from < end && done < most) {
    let field = firstField;
    let next = from;
    const offset = <usize>done << 3;
    const offsetBefore = <usize>(done > 0 ? done : most) * 8 - 8;
    let byte: u32 = 0;
    while (true) {
      const slot = changetype<Slot>(load<usize>(field));
      if (changetype<usize>(slot) == 0) {
        byte = load<u8>(next);
        while (byte != separator && byte != lineEnd && byte != 34) {
          next += 1;
          byte = load<u8>(next);
        }
      } else if (isRepeated(slot, next)) {
        store<f64>(slot.values + offset, load<f64>(slot.values + offsetBefore));
        next += slot.length;
        byte = load<u8>(next);
      } else {
        byte = load<u8>(next);
        const isNegative = byte == 45;
        let place = isNegative ? next + 1 : next;
        let count = digitCount(place);
        let digits: u64 = 0;
        let written = count;
        if (count == 1) digits = <u64>load<u8>(place) - 48;
        else if (count != 0) digits = digitsAt(place, count);
        place += count;
        byte = load<u8>(place);
        let q: i32 = 0;
        if (byte == 46 || (takesComma && byte == 44)) {
          if ((byte == 46 ? pointMark : commaMark) != knownMark) break;
          place += 1;
          const start = place;
          count = digitCount(place);
          while (count == 8) {
            digits = digits * 100_000_000 + digitsAt(place, 8);
            place += 8;
            count = digitCount(place);
          }
          if (count != 0) digits = digits * load<u64>(wholePowers + (<usize>count << 3)) + digitsAt(place, count);
          place += count;
          q = <i32>(start - place);
          written -= q;
          byte = load<u8>(place);
        }
        if ((byte | 32) == 101) {
          place += 1;
          byte = load<u8>(place);
          const isBelow = byte == 45;
          if (isBelow || byte == 43) place += 1;
          let power: i32 = 0;
          const start = place;
          let digit = <u32>load<u8>(place) - 48;
          while (digit <= 9 && place - start < 4) {
            power = power * 10 + digit;
            place += 1;
            digit = <u32>load<u8>(place) - 48;
          }
          if (place == start) break;
          q += isBelow ? -power : power;
          byte = digit + 48;
        }
        if (written - 1 > 18) break;
        const size = convertPlain(digits, q);
        if (size != size || digits >= slot.limit) break;
        store<u64>(slot.values + offset, reinterpret<u64>(size) | (<u64>isNegative << 63));
        slot.before = next;
        slot.length = place - next;
        next = place;
      }
      field += 4;
      next += 1;
      if (byte == separator && field != fieldsEnd) continue;
      if (byte == 13 && lineEnd != 13) {
        byte = load<u8>(next);
        next += 1;
      }
      if (byte != lineEnd) field = 0;
      break;
    }
    if (field != fieldsEnd) break;
    seen += 1;
    store<f64>(lines + offset, seen);
    done += 1;
    from = next;
  }
  moveTo(from, done, seen);
}
