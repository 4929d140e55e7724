// AssemblyScript. The sums that norms are made of, over columns in memory: what lib/numerics/norms/run-sums.ts does, bit for bit.

const run: usize = 128;

@unmanaged
class State {
  absolute: f64;
  absoluteLost: f64;
  square: f64;
  squareLost: f64;
  signed: f64;
  signedLost: f64;
  exactAbsolute: f64;
  exactAbsoluteLost: f64;
  exactSquare: f64;
  exactSquareLost: f64;
  largest: f64;
  exactLargest: f64;
  min: f64;
  max: f64;
  /** Row of the block with the largest error so far, -1 where it is in none. */
  largestRow: f64;
  /** 1 where something was not finite, or so large that sums of its squares may not be. */
  isBad: f64;
}

/** Sums of this many squares must fit into a double. */
const mostRows: f64 = 1099511627776;

/** Adds to the sum at `at`, and what is rounded away to what follows it (A. Neumaier, 1974, method IV). */
@inline
function addTo(at: usize, value: f64): void {
  const sum = load<f64>(at);
  const next = sum + value;
  store<f64>(at + 8, load<f64>(at + 8) + (abs(sum) >= abs(value) ? sum - next + value : value - next + sum));
  store<f64>(at, next);
}

@inline
function total(lanes: v128): f64 {
  return f64x2.extract_lane(lanes, 0) + f64x2.extract_lane(lanes, 1);
}

/** Rows from `values`, at most a run of them; a last odd row goes to the first lane. */
@inline
function addRun(state: State, values: usize, exact: usize, weights: usize, bytes: usize): void {
  let absolute = f64x2.splat(0), square = absolute, signed = absolute, exactAbsolute = absolute, exactSquare = absolute;
  let largest = f64x2.splat(state.largest), exactLargest = f64x2.splat(state.exactLargest);
  let min = f64x2.splat(state.min), max = f64x2.splat(state.max);
  const one = f64x2.splat(1);
  for (let at: usize = 0; at < bytes; at += 16) {
    const isPair = at + 8 < bytes;
    // A lone last row stands beside a row of weight 0 with no error.
    const value = isPair ? v128.load(values + at) : f64x2.splat(load<f64>(values + at));
    const known = isPair ? v128.load(exact + at) : f64x2.splat(load<f64>(exact + at));
    let weight = weights == 0 ? one : isPair ? v128.load(weights + at) : f64x2.splat(load<f64>(weights + at));
    if (!isPair) weight = f64x2.replace_lane(weight, 1, 0);
    const error = f64x2.sub(value, known);
    const size = f64x2.abs(error);
    const exactSize = f64x2.abs(known);
    const weighted = f64x2.mul(weight, error);
    absolute = f64x2.add(absolute, f64x2.mul(weight, size));
    square = f64x2.add(square, f64x2.mul(weighted, error));
    signed = f64x2.add(signed, weighted);
    exactAbsolute = f64x2.add(exactAbsolute, f64x2.mul(weight, exactSize));
    exactSquare = f64x2.add(exactSquare, f64x2.mul(f64x2.mul(weight, known), known));
    largest = f64x2.pmax(largest, size);
    exactLargest = f64x2.pmax(exactLargest, exactSize);
    min = f64x2.pmin(min, value);
    max = f64x2.pmax(max, value);
  }
  const at = changetype<usize>(state);
  const squares = total(square);
  const exactSquares = total(exactSquare);
  addTo(at, total(absolute));
  addTo(at + 16, squares);
  addTo(at + 32, total(signed));
  addTo(at + 48, total(exactAbsolute));
  addTo(at + 64, exactSquares);
  state.largest = max2(largest);
  state.exactLargest = max2(exactLargest);
  state.min = min2(min);
  state.max = max2(max);
  if (!(squares * mostRows < Infinity) || !(exactSquares * mostRows < Infinity)) state.isBad = 1;
}

@inline
function max2(lanes: v128): f64 {
  const a = f64x2.extract_lane(lanes, 0);
  const b = f64x2.extract_lane(lanes, 1);
  return a < b ? b : a;
}

@inline
function min2(lanes: v128): f64 {
  const a = f64x2.extract_lane(lanes, 0);
  const b = f64x2.extract_lane(lanes, 1);
  return b < a ? b : a;
}

/** The first row of the largest error, which stands in the columns. */
function findLargest(values: usize, exact: usize, largest: f64): f64 {
  let row: f64 = 0;
  while (abs(load<f64>(values) - load<f64>(exact)) != largest) {
    values += 8;
    exact += 8;
    row += 1;
  }
  return row;
}

/** Adds rows of one field to its state; `weights` is 0 where all rows weigh the same. */
export function addErrors(at: usize, values: usize, exact: usize, weights: usize, rows: u32): void {
  const state = changetype<State>(at);
  const before = state.largest;
  const bytes = <usize>rows << 3;
  for (let from: usize = 0; from < bytes; from += run << 3) {
    addRun(state, values + from, exact + from, weights == 0 ? 0 : weights + from, min(run << 3, bytes - from));
  }
  if (state.largest > before) state.largestRow = findLargest(values, exact, state.largest);
}

/** Adds weights to the sum at `at`, and marks the state where one is not above 0 or not finite. */
export function addWeights(at: usize, weights: usize, rows: u32): void {
  const bytes = <usize>rows << 3;
  const nothing = f64x2.splat(0);
  const infinite = f64x2.splat(Infinity);
  let good = i64x2.splat(-1);
  for (let from: usize = 0; from < bytes; from += run << 3) {
    const end = min(from + (run << 3), bytes);
    let sum = nothing;
    for (let row = from; row < end; row += 16) {
      const isPair = row + 8 < end;
      const weight = isPair ? v128.load(weights + row) : f64x2.splat(load<f64>(weights + row));
      sum = f64x2.add(sum, isPair ? weight : f64x2.replace_lane(weight, 1, 0));
      good = v128.and(good, v128.and(f64x2.gt(weight, nothing), f64x2.lt(weight, infinite)));
    }
    addTo(at, total(sum));
  }
  if (!i64x2.all_true(good)) store<f64>(at + 16, 1);
}
