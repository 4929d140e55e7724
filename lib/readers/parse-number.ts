/** What parseNumber saw; one object is used again for every number. */
export interface NumberReading {
  status: 'number' | 'not-finite' | 'not-a-number';
  /** From the first digit that is not zero to the last one written. */
  digits: number;
  mark: 'point' | 'comma' | 'none';
}

const exactPowers = Float64Array.from({ length: 23 }, (_, power) => Number(`1e${power}`));
const largestExact = 2 ** 53;
const notFinite = /^[+-]?(?:nan(?:\([a-z0-9]*\))?|inf(?:inity)?|\d\.#(?:ind|inf|qnan|snan)\d*)$/i;
const decimal = /^[+-]?(?:\d+[.,]?\d*|[.,]\d+)(?:[eEdDqQ][+-]?\d+|[+-]\d{3})?$/;

/**
 * The number written in bytes[from, to), rounded correctly to a double; NaN with the reason in `reading` where there is
 * none. Takes Fortran's D and Q exponents, also without their letter (1.5-101), and a decimal comma where told.
 *
 * A mantissa below 2⁵³ and a power of ten up to 10²² are both exact, so that one product or quotient rounds correctly
 * (W. D. Clinger, How to read floating point numbers accurately, 1990); all else goes through the language's own conversion.
 */
export function parseNumber(bytes: Buffer, from: number, to: number, allowComma: boolean, reading: NumberReading): number {
  let at = from;
  let sign = bytes[at] as number;
  if (sign === 45 || sign === 43) at += 1;
  else sign = 43;
  let mantissa = 0;
  let digits = 0;
  let written = 0;
  let places = -1;
  reading.mark = 'none';
  for (; at < to; at += 1) {
    const byte = bytes[at] as number;
    if (byte >= 48 && byte <= 57) {
      mantissa = mantissa * 10 + (byte - 48);
      written += 1;
      if (digits > 0 || byte !== 48) digits += 1;
      if (places >= 0) places += 1;
    } else if (places < 0 && (byte === 46 || (allowComma && byte === 44))) {
      places = 0;
      reading.mark = byte === 46 ? 'point' : 'comma';
    } else break;
  }
  reading.digits = digits;
  reading.status = 'number';
  if (written === 0) return convertText(bytes, from, to, allowComma, reading);
  let power = places > 0 ? -places : 0;
  if (at < to) {
    const exponent = readExponent(bytes, at, to);
    if (exponent === null) return convertText(bytes, from, to, allowComma, reading);
    power += exponent;
  }
  if (digits > 16 || mantissa >= largestExact || power < -22 || power > 22) {
    const value = Number(bytes.toString('latin1', from, to));
    // Not what the language writes (a comma, a D), or beyond the largest double.
    return Number.isFinite(value) ? value : convertText(bytes, from, to, allowComma, reading);
  }
  const size = power < 0 ? mantissa / (exactPowers[-power] as number) : mantissa * (exactPowers[power] as number);
  return sign === 45 ? -size : size;
}

/** The exponent from its letter to the end, null where it is anything unusual. */
function readExponent(bytes: Buffer, start: number, to: number): number | null {
  const letter = (bytes[start] as number) | 32;
  if (letter !== 101 && letter !== 100) return null;
  let at = start + 1;
  const sign = bytes[at] as number;
  if (sign === 45 || sign === 43) at += 1;
  if (at >= to || to - at > 3) return null;
  let exponent = 0;
  for (; at < to; at += 1) {
    const digit = (bytes[at] as number) - 48;
    if (!(digit >= 0 && digit <= 9)) return null;
    exponent = exponent * 10 + digit;
  }
  return sign === 45 ? -exponent : exponent;
}

/** What is not plainly digits, a mark and an exponent, or not finite: Fortran's spellings, NaN, text. */
function convertText(bytes: Buffer, from: number, to: number, allowComma: boolean, reading: NumberReading): number {
  const text = bytes.toString('latin1', from, to);
  if (decimal.test(text) && (allowComma || !text.includes(','))) {
    const spelled = text.replace(',', '.').replace(/[dDqQ]/, 'e').replace(/(\d\.?)([+-]\d{3})$/, '$1e$2');
    const converted = Number(spelled);
    reading.status = Number.isFinite(converted) ? 'number' : 'not-finite';
    return Number.isFinite(converted) ? converted : NaN;
  }
  reading.status = notFinite.test(text) ? 'not-finite' : 'not-a-number';
  return NaN;
}
