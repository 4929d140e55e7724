// AssemblyScript. Operations on columns of doubles in memory, two rows at a time: each does what the language does row by row.

export function add(a: usize, b: usize, into: usize, rows: u32): void {
  const end = into + (<usize>rows << 3);
  for (; into + 8 < end; into += 16, a += 16, b += 16) v128.store(into, f64x2.add(v128.load(a), v128.load(b)));
  if (into < end) store<f64>(into, load<f64>(a) + load<f64>(b));
}

export function subtract(a: usize, b: usize, into: usize, rows: u32): void {
  const end = into + (<usize>rows << 3);
  for (; into + 8 < end; into += 16, a += 16, b += 16) v128.store(into, f64x2.sub(v128.load(a), v128.load(b)));
  if (into < end) store<f64>(into, load<f64>(a) - load<f64>(b));
}

export function multiply(a: usize, b: usize, into: usize, rows: u32): void {
  const end = into + (<usize>rows << 3);
  for (; into + 8 < end; into += 16, a += 16, b += 16) v128.store(into, f64x2.mul(v128.load(a), v128.load(b)));
  if (into < end) store<f64>(into, load<f64>(a) * load<f64>(b));
}

export function divide(a: usize, b: usize, into: usize, rows: u32): void {
  const end = into + (<usize>rows << 3);
  for (; into + 8 < end; into += 16, a += 16, b += 16) v128.store(into, f64x2.div(v128.load(a), v128.load(b)));
  if (into < end) store<f64>(into, load<f64>(a) / load<f64>(b));
}

export function addNumber(number: f64, b: usize, into: usize, rows: u32): void {
  const end = into + (<usize>rows << 3);
  const both = f64x2.splat(number);
  for (; into + 8 < end; into += 16, b += 16) v128.store(into, f64x2.add(both, v128.load(b)));
  if (into < end) store<f64>(into, number + load<f64>(b));
}

export function multiplyByNumber(number: f64, b: usize, into: usize, rows: u32): void {
  const end = into + (<usize>rows << 3);
  const both = f64x2.splat(number);
  for (; into + 8 < end; into += 16, b += 16) v128.store(into, f64x2.mul(both, v128.load(b)));
  if (into < end) store<f64>(into, number * load<f64>(b));
}

export function roots(from: usize, into: usize, rows: u32): void {
  const end = into + (<usize>rows << 3);
  for (; into + 8 < end; into += 16, from += 16) v128.store(into, f64x2.sqrt(v128.load(from)));
  if (into < end) store<f64>(into, sqrt(load<f64>(from)));
}

export function negate(from: usize, into: usize, rows: u32): void {
  const end = into + (<usize>rows << 3);
  for (; into + 8 < end; into += 16, from += 16) v128.store(into, f64x2.neg(v128.load(from)));
  if (into < end) store<f64>(into, -load<f64>(from));
}

/** Copies the rows whose places are given, as numbers of 32 bits. */
export function pick(from: usize, places: usize, into: usize, rows: u32): void {
  const end = into + (<usize>rows << 3);
  for (; into < end; into += 8, places += 4) store<f64>(into, load<f64>(from + (<usize>load<u32>(places) << 3)));
}
