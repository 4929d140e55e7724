// AssemblyScript. A decimal number in memory to the nearest double.

/** Where the 128-bit powers of five lie: 5^q for q from -342 to 308, the upper 64 bits first. */
let powers: usize = 0;
/** Powers of ten that a double holds exactly, 10^0 to 10^22. */
const exactPowers = memory.data<f64>([
  1e0, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15, 1e16, 1e17, 1e18, 1e19, 1e20, 1e21, 1e22,
]);

const pointMark: u32 = 1;
const commaMark: u32 = 2;
/** Stands for a whole number of more than 19 digits. */
export const allDigits: u64 = 10_000_000_000_000_000_000;

/** What readDecimal found: the value, the byte after it, its digits as a whole number, and its decimal mark. */
export let value: f64 = 0;
export let next: usize = 0;
export let mantissa: u64 = 0;
export let mark: u32 = 0;

let low: u64 = 0;

export function placePowers(at: usize): void {
  powers = at;
}

@inline
function isEightDigits(eight: u64): bool {
  return ((eight & 0xf0f0f0f0f0f0f0f0) | (((eight + 0x0606060606060606) & 0xf0f0f0f0f0f0f0f0) >> 4)) == 0x3333333333333333;
}

/** Eight digits at once: pairs, then fours, then all (the first digit lies in the lowest byte). */
@inline
function eightDigits(eight: u64): u64 {
  eight -= 0x3030303030303030;
  eight = eight * 10 + (eight >> 8);
  return (((eight & 0x000000ff000000ff) * 0x000f424000000064) + (((eight >> 16) & 0x000000ff000000ff) * 0x0000271000000001)) >> 32;
}

/** The upper half of a 128-bit product; the lower one is left in `low`. */
@inline
function multiply(a: u64, b: u64): u64 {
  const aLow = a & 0xffffffff;
  const aHigh = a >> 32;
  const bLow = b & 0xffffffff;
  const bHigh = b >> 32;
  const cross = aHigh * bLow + ((aLow * bLow) >> 32);
  const other = aLow * bHigh + (cross & 0xffffffff);
  low = a * b;
  return aHigh * bHigh + (cross >> 32) + (other >> 32);
}

/**
 * w·10^q rounded to nearest, ties to even; NaN where the 128 bits of the power do not decide, or beyond the largest double.
 * D. Lemire, Number parsing at a gigabyte per second, Softw. Pract. Exper. 51 (2021) 1700–1727, sections 5 to 9.
 */
function scale(w: u64, q: i32): f64 {
  if (w == 0 || q < -342) return 0;
  if (q > 308) return NaN;
  const zeros = clz(w);
  w <<= zeros;
  const power = powers + ((q + 342) << 4);
  let high = multiply(w, load<u64>(power));
  let lower = low;
  if ((high & 0x1ff) == 0x1ff) {
    const more = multiply(w, load<u64>(power, 8));
    lower += more;
    if (more > lower) high += 1;
  }
  if (lower == u64.MAX_VALUE && (q < -27 || q > 55)) return NaN;
  const upper = high >> 63;
  const shift = upper + 9;
  let bits = high >> shift;
  let exponent = <i64>(((217706 * q) >> 16) + 63) + <i64>upper - <i64>zeros + 1023;
  if (exponent <= 0) {
    if (1 - exponent >= 64) return 0;
    bits >>= 1 - exponent;
    bits = (bits + (bits & 1)) >> 1;
    return reinterpret<f64>(bits);
  }
  // A product that is exact and halfway between two doubles goes to the even one.
  if (lower <= 1 && q >= -4 && q <= 23 && (bits & 3) == 1 && (bits << shift) == high) bits &= ~1;
  bits = (bits + (bits & 1)) >> 1;
  if (bits >= 1 << 53) {
    bits = 1 << 52;
    exponent += 1;
  }
  if (exponent >= 0x7ff) return NaN;
  return reinterpret<f64>((bits & 0xfffffffffffff) | (<u64>exponent << 52));
}

@inline
function convert(w: u64, q: i32): f64 {
  if (w <= 1 << 53 && q >= -22 && q <= 22) {
    return q < 0 ? <f64>w / load<f64>(exactPowers + (-q << 3)) : <f64>w * load<f64>(exactPowers + (q << 3));
  }
  return scale(w, q);
}

/** More than 19 digits: where the first 19 and the next number of 19 digits round to one double, so does all between. */
function convertLong(from: usize, to: usize, exponent: i32): f64 {
  let w: u64 = 0;
  let kept = 0;
  let dropped = 0;
  let isAfterMark = false;
  for (let at = from; at < to; at += 1) {
    const digit = <u32>load<u8>(at) - 48;
    if (digit > 9) isAfterMark = true;
    else if (kept < 19) {
      w = w * 10 + digit;
      if (w != 0) kept += 1;
      if (isAfterMark) exponent -= 1;
    } else {
      dropped += 1;
      if (!isAfterMark) exponent += 1;
    }
  }
  const under = convert(w, exponent);
  if (dropped == 0) {
    mantissa = w;
    return under;
  }
  mantissa = allDigits;
  return under == convert(w + 1, exponent) ? under : NaN;
}

/**
 * Reads the number that begins at `at`: digits, a mark, an exponent with E or D. True with its parts in the variables
 * above; false where it does not begin as one, or is one that only the language's own conversion decides.
 */
@inline
export function readDecimal(at: usize, allowComma: bool): bool {
  let byte = <u32>load<u8>(at);
  const isNegative = byte == 45;
  if (isNegative || byte == 43) at += 1;
  const from = at;
  let w: u64 = 0;
  let digit = <u32>load<u8>(at) - 48;
  while (digit <= 9) {
    w = w * 10 + digit;
    at += 1;
    digit = <u32>load<u8>(at) - 48;
  }
  let written = at - from;
  let q: i32 = 0;
  mark = 0;
  byte = digit + 48;
  if (byte == 46 || (allowComma && byte == 44)) {
    mark = byte == 46 ? pointMark : commaMark;
    at += 1;
    const start = at;
    let eight = load<u64>(at);
    while (isEightDigits(eight)) {
      w = w * 100_000_000 + eightDigits(eight);
      at += 8;
      eight = load<u64>(at);
    }
    digit = <u32>load<u8>(at) - 48;
    while (digit <= 9) {
      w = w * 10 + digit;
      at += 1;
      digit = <u32>load<u8>(at) - 48;
    }
    written += at - start;
    q = -(<i32>(at - start));
    byte = digit + 48;
  }
  if (written == 0) return false;
  const to = at;
  let power: i32 = 0;
  const letter = byte | 32;
  if (letter == 101 || letter == 100) {
    at += 1;
    byte = <u32>load<u8>(at);
    const isBelow = byte == 45;
    if (isBelow || byte == 43) at += 1;
    const start = at;
    digit = <u32>load<u8>(at) - 48;
    while (digit <= 9 && at - start < 5) {
      power = power * 10 + digit;
      at += 1;
      digit = <u32>load<u8>(at) - 48;
    }
    if (at == start || digit <= 9) return false;
    if (isBelow) power = -power;
  }
  next = at;
  let size: f64;
  if (written > 19) size = convertLong(from, to, power);
  else {
    mantissa = w;
    size = convert(w, q + power);
  }
  if (size != size) return false;
  value = isNegative ? -size : size;
  return true;
}
