// AssemblyScript. Exponentials, two at a time, with the bits of the language's own: K. C. Ng, fdlibm 5.3 (Sun Microsystems,
// 1995), e_exp.c, without a branch. Values next to 0, 1 exactly and results beyond ordinary doubles are left to the language.

@external("env", "exponential")
declare function plainExponential(value: f64): f64;

const perLn2: f64 = 1.44269504088896338700;
const ln2: f64 = 6.93147180369123816490e-1;
const ln2Rest: f64 = 1.90821492927058770002e-10;
/** Up to here a value is its own remainder: half of ln 2, as far as its upper half goes. */
const half = reinterpret<f64>(0x3fd62e4300000000);
/** Below this one ln 2 is taken away, however it would be rounded. */
const oneAndHalf = reinterpret<f64>(0x3ff0a2b200000000);
const least: f64 = 3.7252902984619140625e-9;
const most: f64 = 700;
const bias: f64 = 4503599627370496 + 1023;

@inline
function both(value: f64): v128 {
  return f64x2.splat(value);
}

@inline
function exponentialOf(value: v128): v128 {
  const size = f64x2.abs(value);
  const isPlain = v128.and(v128.and(f64x2.ge(size, both(least)), f64x2.lt(size, both(most))), f64x2.ne(value, both(1)));
  if (!i64x2.all_true(isPlain)) return f64x2(plainExponential(f64x2.extract_lane(value, 0)), plainExponential(f64x2.extract_lane(value, 1)));
  const sign = v128.and(value, i64x2.splat(i64.MIN_VALUE));
  const isWhole = f64x2.lt(size, both(half));
  const rounded = f64x2.trunc(f64x2.add(f64x2.mul(both(perLn2), value), v128.or(both(0.5), sign)));
  const one = v128.or(both(1), sign);
  const k = v128.andnot(v128.bitselect(one, rounded, f64x2.lt(size, both(oneAndHalf))), isWhole);
  const high = f64x2.sub(value, f64x2.mul(k, both(ln2)));
  const low = f64x2.mul(k, both(ln2Rest));
  const x = f64x2.sub(high, low);
  const t = f64x2.mul(x, x);
  let sum = f64x2.add(both(-1.65339022054652515390e-6), f64x2.mul(t, both(4.13813679705723846039e-8)));
  sum = f64x2.add(both(6.61375632143793436117e-5), f64x2.mul(t, sum));
  sum = f64x2.add(both(-2.77777777770155933842e-3), f64x2.mul(t, sum));
  sum = f64x2.add(both(1.66666666666666019037e-1), f64x2.mul(t, sum));
  const c = f64x2.sub(x, f64x2.mul(t, sum));
  // Of a whole remainder low is 0 and high the value, so that this is 1 − (xc/(c − 2) − x) too.
  const y = f64x2.sub(both(1), f64x2.sub(f64x2.sub(low, f64x2.div(f64x2.mul(x, c), f64x2.sub(both(2), c))), high));
  const power = i64x2.shl(f64x2.add(k, both(bias)), 52);
  return f64x2.mul(y, power);
}

export function exponentials(from: usize, into: usize, rows: u32): void {
  let before = both(NaN);
  let result = before;
  const end = from + (<usize>(rows & ~1) << 3);
  const apart = into - from;
  for (; from < end; from += 16) {
    const x = v128.load(from);
    if (!i64x2.all_true(f64x2.eq(x, before))) {
      before = x;
      result = exponentialOf(x);
    }
    v128.store(from + apart, result);
  }
  if (rows & 1) store<f64>(from + apart, plainExponential(load<f64>(from)));
}
