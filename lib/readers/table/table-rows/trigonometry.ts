// AssemblyScript. Sines and cosines, two at a time, with the bits of the language's own: the same published procedure,
// K. C. Ng, fdlibm 5.3 (Sun Microsystems, 1995), k_sin.c, k_cos.c and the first step of e_rem_pio2.c, without a branch.
// What takes its further steps is left to the language.

@external("env", "sine")
declare function plainSine(value: f64): f64;
@external("env", "cosine")
declare function plainCosine(value: f64): f64;

/**
 * Numbers that the procedure takes, each twice, as a vector has them: read from memory they take one instruction, in the code
 * three. The quarter is the first double above π/4 whose lower half is 0, below which a size is its own remainder; from
 * `most` on multiples of π/2 need more digits; π/2 is given as its first 33 bits and the rest; 2^52 added to a whole number
 * leaves its bits at the end.
 */
const numbers = memory.data<f64>([
  0.7853984832763672, 0.7853984832763672,
  1647099.0, 1647099.0,
  6.36619772367581382433e-1, 6.36619772367581382433e-1,
  1.57079632673412561417, 1.57079632673412561417,
  6.07710050650619224932e-11, 6.07710050650619224932e-11,
  4503599627370496, 4503599627370496,
  4503599627370497, 4503599627370497,
  0.5, 0.5,
  1, 1,
  0.0000152587890625, 0.0000152587890625,
  -1.66666666666666324348e-1, -1.66666666666666324348e-1,
  8.33333333332248946124e-3, 8.33333333332248946124e-3,
  -1.98412698298579493134e-4, -1.98412698298579493134e-4,
  2.75573137070700676789e-6, 2.75573137070700676789e-6,
  -2.50507602534068634195e-8, -2.50507602534068634195e-8,
  1.58969099521155010221e-10, 1.58969099521155010221e-10,
  4.16666666666666019037e-2, 4.16666666666666019037e-2,
  -1.38888888888741095749e-3, -1.38888888888741095749e-3,
  2.48015872894767294178e-5, 2.48015872894767294178e-5,
  -2.75573143513906633035e-7, -2.75573143513906633035e-7,
  2.08757232129817482790e-9, 2.08757232129817482790e-9,
  -1.13596475577881948265e-11, -1.13596475577881948265e-11,
  0.2999999523162842, 0.2999999523162842,
  0.7812504768371582, 0.7812504768371582,
  0.28125, 0.28125,
], 16);
const quarter: usize = 0;
const most: usize = 16;
const twoOverPi: usize = 32;
const halfPi: usize = 48;
const halfPiRest: usize = 64;
const wholeBits: usize = 80;
const nextWholeBits: usize = 96;
const half: usize = 112;
const one: usize = 128;
const close: usize = 144;
const sine1: usize = 160;
const sine2: usize = 176;
const sine3: usize = 192;
const sine4: usize = 208;
const sine5: usize = 224;
const sine6: usize = 240;
const cosine1: usize = 256;
const cosine2: usize = 272;
const cosine3: usize = 288;
const cosine4: usize = 304;
const cosine5: usize = 320;
const cosine6: usize = 336;
const smallAngle: usize = 352;
const wideAngle: usize = 368;
const wideQuarter: usize = 384;

@inline
function vector(offset: usize): v128 {
  return v128.load(numbers + offset);
}

@inline
function step(z: v128, sum: v128, coefficient: usize): v128 {
  return f64x2.add(vector(coefficient), f64x2.mul(z, sum));
}

/** sin(y + rest) for sizes up to π/4; `whole` marks those without a rest. */
@inline
function sineNear(y: v128, rest: v128, whole: v128): v128 {
  const z = f64x2.mul(y, y);
  const v = f64x2.mul(z, y);
  let r = step(z, vector(sine6), sine5);
  r = step(z, r, sine4);
  r = step(z, r, sine3);
  r = step(z, r, sine2);
  const first = vector(sine1);
  const plain = f64x2.add(y, f64x2.mul(v, f64x2.add(first, f64x2.mul(z, r))));
  const inner = f64x2.sub(f64x2.mul(z, f64x2.sub(f64x2.mul(vector(half), rest), f64x2.mul(v, r))), rest);
  return v128.bitselect(plain, f64x2.sub(y, f64x2.sub(inner, f64x2.mul(v, first))), whole);
}

/** cos(y + rest) for sizes up to π/4. */
@inline
function cosineNear(y: v128, rest: v128): v128 {
  const z = f64x2.mul(y, y);
  let r = step(z, vector(cosine6), cosine5);
  r = step(z, r, cosine4);
  r = step(z, r, cosine3);
  r = step(z, r, cosine2);
  r = f64x2.mul(z, step(z, r, cosine1));
  const size = f64x2.abs(y);
  const upper = v128.and(size, i64x2.splat(0x7fffffff00000000));
  const fourth = i64x2.sub(upper, i64x2.splat(0x0020000000000000));
  let q = v128.bitselect(vector(wideQuarter), fourth, f64x2.ge(size, vector(wideAngle)));
  q = v128.andnot(q, f64x2.lt(size, vector(smallAngle)));
  const lower = f64x2.sub(f64x2.mul(vector(half), z), q);
  return f64x2.sub(f64x2.sub(vector(one), q), f64x2.sub(lower, f64x2.sub(f64x2.mul(z, r), f64x2.mul(y, rest))));
}

/** Sines of two values, or cosines, which are sines a quarter of a turn on. */
@inline
function turn(x: v128, isCosine: bool): v128 {
  const size = f64x2.abs(x);
  const whole = f64x2.lt(size, vector(quarter));
  const turns = v128.andnot(f64x2.floor(f64x2.add(f64x2.mul(size, vector(twoOverPi)), vector(half))), whole);
  const left = f64x2.sub(size, f64x2.mul(turns, vector(halfPi)));
  const less = f64x2.mul(turns, vector(halfPiRest));
  const y = f64x2.sub(left, less);
  const rest = f64x2.sub(f64x2.sub(left, y), less);
  const count = f64x2.add(turns, vector(isCosine ? nextWholeBits : wholeBits));
  const odd = i64x2.neg(v128.and(count, i64x2.splat(1)));
  const sign = i64x2.shl(v128.and(count, i64x2.splat(2)), 62);
  let near: v128;
  const quadrants = i64x2.bitmask(odd);
  if (quadrants == 0) near = sineNear(y, rest, whole);
  else {
    near = cosineNear(y, rest);
    if (quadrants != 3) near = v128.bitselect(near, sineNear(y, rest, whole), odd);
  }
  const value = v128.xor(near, sign);
  const result = isCosine ? value : v128.xor(value, v128.and(x, i64x2.splat(i64.MIN_VALUE)));
  // Close to a multiple of π/2, very large or not a number.
  const isPlain = v128.andnot(f64x2.lt(size, vector(most)), f64x2.lt(f64x2.abs(y), f64x2.mul(size, vector(close))));
  if (i64x2.all_true(isPlain)) return result;
  return isCosine
    ? f64x2(plainCosine(f64x2.extract_lane(x, 0)), plainCosine(f64x2.extract_lane(x, 1)))
    : f64x2(plainSine(f64x2.extract_lane(x, 0)), plainSine(f64x2.extract_lane(x, 1)));
}

/** Values that stand in several rows on end, as coordinates of structured grids do, are computed once. */
@inline
function turnColumn(from: usize, into: usize, rows: u32, isCosine: bool): void {
  let before = f64x2.splat(NaN);
  let result = before;
  const end = from + (<usize>(rows & ~1) << 3);
  const apart = into - from;
  for (; from < end; from += 16) {
    const x = v128.load(from);
    if (!i64x2.all_true(f64x2.eq(x, before))) {
      before = x;
      result = turn(x, isCosine);
    }
    v128.store(from + apart, result);
  }
  if (rows & 1) store<f64>(from + apart, isCosine ? plainCosine(load<f64>(from)) : plainSine(load<f64>(from)));
}

export function sines(from: usize, into: usize, rows: u32): void {
  turnColumn(from, into, rows, false);
}

export function cosines(from: usize, into: usize, rows: u32): void {
  turnColumn(from, into, rows, true);
}
