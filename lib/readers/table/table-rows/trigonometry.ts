// AssemblyScript. Sines and cosines, two at a time, with the bits of the language's own: the same published procedure,
// K. C. Ng, fdlibm 5.3 (Sun Microsystems, 1995), k_sin.c, k_cos.c and the first step of e_rem_pio2.c, without a branch.
// What takes its further steps is left to the language.

// @ts-ignore: decorator
@external("env", "sine")
declare function plainSine(value: f64): f64;
// @ts-ignore: decorator
@external("env", "cosine")
declare function plainCosine(value: f64): f64;

/** Smaller sizes are their own remainder: the first double above π/4 whose lower half is 0. */
const quarter = reinterpret<f64>(0x3fe921fc00000000);
/** From here on multiples of π/2 need more digits. */
const most = reinterpret<f64>(0x413921fb00000000);
const twoOverPi: f64 = 6.36619772367581382433e-1;
/** The first 33 bits of π/2, and the rest. */
const halfPi: f64 = 1.57079632673412561417;
const halfPiRest: f64 = 6.07710050650619224932e-11;
/** 2^52: added to a whole number, it leaves its bits at the end. */
const wholeBits: f64 = 4503599627370496;

@inline
function both(value: f64): v128 {
  return f64x2.splat(value);
}

@inline
function step(z: v128, sum: v128, coefficient: f64): v128 {
  return f64x2.add(both(coefficient), f64x2.mul(z, sum));
}

/** sin(y + rest) for sizes up to π/4; `whole` marks those without a rest. */
@inline
function sineNear(y: v128, rest: v128, whole: v128): v128 {
  const z = f64x2.mul(y, y);
  const v = f64x2.mul(z, y);
  let r = step(z, both(1.58969099521155010221e-10), -2.50507602534068634195e-8);
  r = step(z, r, 2.75573137070700676789e-6);
  r = step(z, r, -1.98412698298579493134e-4);
  r = step(z, r, 8.33333333332248946124e-3);
  const first = both(-1.66666666666666324348e-1);
  const plain = f64x2.add(y, f64x2.mul(v, f64x2.add(first, f64x2.mul(z, r))));
  const inner = f64x2.sub(f64x2.mul(z, f64x2.sub(f64x2.mul(both(0.5), rest), f64x2.mul(v, r))), rest);
  return v128.bitselect(plain, f64x2.sub(y, f64x2.sub(inner, f64x2.mul(v, first))), whole);
}

/** cos(y + rest) for sizes up to π/4. */
@inline
function cosineNear(y: v128, rest: v128): v128 {
  const z = f64x2.mul(y, y);
  let r = step(z, both(-1.13596475577881948265e-11), 2.08757232129817482790e-9);
  r = step(z, r, -2.75573143513906633035e-7);
  r = step(z, r, 2.48015872894767294178e-5);
  r = step(z, r, -1.38888888888741095749e-3);
  r = f64x2.mul(z, step(z, r, 4.16666666666666019037e-2));
  const size = f64x2.abs(y);
  const upper = v128.and(size, i64x2.splat(0x7fffffff00000000));
  const fourth = i64x2.sub(upper, i64x2.splat(0x0020000000000000));
  let q = v128.bitselect(both(0.28125), fourth, f64x2.ge(size, both(reinterpret<f64>(0x3fe9000100000000))));
  q = v128.andnot(q, f64x2.lt(size, both(reinterpret<f64>(0x3fd3333300000000))));
  const half = f64x2.sub(f64x2.mul(both(0.5), z), q);
  return f64x2.sub(f64x2.sub(both(1), q), f64x2.sub(half, f64x2.sub(f64x2.mul(z, r), f64x2.mul(y, rest))));
}

/** Sines of two values, or cosines, which are sines a quarter of a turn on. */
@inline
function turn(x: v128, isCosine: bool): v128 {
  const size = f64x2.abs(x);
  const whole = f64x2.lt(size, both(quarter));
  const turns = v128.andnot(f64x2.floor(f64x2.add(f64x2.mul(size, both(twoOverPi)), both(0.5))), whole);
  const near = f64x2.sub(size, f64x2.mul(turns, both(halfPi)));
  const less = f64x2.mul(turns, both(halfPiRest));
  const y = f64x2.sub(near, less);
  const rest = f64x2.sub(f64x2.sub(near, y), less);
  const count = f64x2.add(turns, both(isCosine ? wholeBits + 1 : wholeBits));
  const odd = i64x2.neg(v128.and(count, i64x2.splat(1)));
  const sign = i64x2.shl(v128.and(count, i64x2.splat(2)), 62);
  const value = v128.xor(v128.bitselect(cosineNear(y, rest), sineNear(y, rest, whole), odd), sign);
  const result = isCosine ? value : v128.xor(value, v128.and(x, i64x2.splat(i64.MIN_VALUE)));
  // Close to a multiple of π/2, very large or not a number.
  const isPlain = v128.andnot(f64x2.lt(size, both(most)), f64x2.lt(f64x2.abs(y), f64x2.mul(size, both(0.0000152587890625))));
  if (i64x2.all_true(isPlain)) return result;
  return isCosine
    ? f64x2(plainCosine(f64x2.extract_lane(x, 0)), plainCosine(f64x2.extract_lane(x, 1)))
    : f64x2(plainSine(f64x2.extract_lane(x, 0)), plainSine(f64x2.extract_lane(x, 1)));
}

/** Values that stand in several rows on end, as coordinates of structured grids do, are computed once. */
@inline
function turnColumn(from: usize, into: usize, rows: u32, isCosine: bool): void {
  let before = both(NaN);
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
