// AssemblyScript. A decimal number in memory to the nearest double.

/** Where the 128-bit powers of five lie: 5^q for q from -342 to 308, the upper 64 bits first. */
let powers: usize = 0;
/** Powers of ten that a double holds exactly, 10^0 to 10^22. */
const exactPowers = memory.data<f64>([
  1e0, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15, 1e16, 1e17, 1e18, 1e19, 1e20, 1e21, 1e22,
]);

/** Powers of ten as whole numbers, 10^0 to 10^8. */
export const wholePowers = memory.data<u64>([1, 10, 100, 1000, 10_000, 100_000, 1_000_000, 10_000_000, 100_000_000]);

export const pointMark: u32 = 1;
export const commaMark: u32 = 2;
/** Stands for a whole number of more than 19 digits. */
export const allDigits: u64 = 10_000_000_000_000_000_000;

/** The digits of the last number as a whole number. */
export let mantissa: u64 = 0;
export function placePowers(at: usize): void {
  powers = at;
}

/**
 * The first `count` digits at `at`, one to eight of them, at once: pairs, then fours, then all (the first digit lies in the
 * lowest byte). What follows them is shifted out, and zeros go before them.
 */
@inline
export function digitsAt(at: usize, count: u32): u64 {
  let eight = (load<u64>(at) - 0x3030303030303030) << <u64>((8 - count) << 3);
  eight = eight * 10 + (eight >> 8);
  return (((eight & 0x000000ff000000ff) * 0x000f424000000064) + (((eight >> 16) & 0x000000ff000000ff) * 0x0000271000000001)) >> 32;
}

/** The upper half of a 128-bit product. */
@inline
function multiply(a: u64, b: u64): u64 {
  const aLow = a & 0xffffffff;
  const aHigh = a >> 32;
  const bLow = b & 0xffffffff;
  const bHigh = b >> 32;
  const cross = aHigh * bLow + ((aLow * bLow) >> 32);
  const other = aLow * bHigh + (cross & 0xffffffff);
  return aHigh * bHigh + (cross >> 32) + (other >> 32);
}

/**
 * w·10^q rounded to nearest, ties to even; NaN where the 128 bits of the power do not decide, or beyond the largest double.
 * D. Lemire, Number parsing at a gigabyte per second, Softw. Pract. Exper. 51 (2021) 1700–1727, sections 5 to 9.
 */
@inline
function scale(w: u64, q: i32): f64 {
  if (w == 0 || q < -342) return 0;
  if (q > 308) return NaN;
  const zeros = clz(w);
  w <<= zeros;
  const power = powers + ((q + 342) << 4);
  let high = multiply(w, load<u64>(power));
  let lower = w * load<u64>(power);
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

/**
 * The same of most numbers, without a call and nearly without a branch: NaN also where the result would not be an ordinary
 * double, or may lie halfway between two.
 */
@inline
export function convertPlain(w: u64, q: i32): f64 {
  if (w <= 1 << 53 && q >= -22 && q <= 22) {
    return q < 0 ? <f64>w / load<f64>(exactPowers + (-q << 3)) : <f64>w * load<f64>(exactPowers + (q << 3));
  }
  if (w == 0 || q < -290 || q > 280) return NaN;
  const zeros = clz(w);
  w <<= zeros;
  const power = powers + ((q + 342) << 4);
  const first = load<u64>(power);
  let high = multiply(w, first);
  let lower = w * first;
  if ((high & 0x1ff) == 0x1ff) {
    const more = multiply(w, load<u64>(power, 8));
    lower += more;
    if (more > lower) high += 1;
  }
  if (lower + 1 <= 2) return NaN;
  const upper = high >> 63;
  const bits = high >> (upper + 9);
  const exponent = <u64>(((217706 * q) >> 16) + 1085) + upper - zeros;
  // Rounded up to 2^53, it carries into the exponent.
  return reinterpret<f64>((exponent << 52) + ((bits + (bits & 1)) >> 1));
}

@inline
export function convert(w: u64, q: i32): f64 {
  if (w <= 1 << 53 && q >= -22 && q <= 22) {
    return q < 0 ? <f64>w / load<f64>(exactPowers + (-q << 3)) : <f64>w * load<f64>(exactPowers + (q << 3));
  }
  return scale(w, q);
}

/** More than 19 digits: where the first 19 and the next number of 19 digits round to one double, so does all between. */
export function convertLong(from: usize, to: usize, exponent: i32): f64 {
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

/** How many of the eight bytes at `at` are digits before the first that is none. */
@inline
export function digitCount(at: usize): u32 {
  const eight = load<u64>(at);
  return <u32>(ctz(((eight + 0x4646464646464646) | (eight - 0x3030303030303030)) & 0x8080808080808080) >> 3);
}

