import type { ErrorColumns } from '../column-engine';

/** Where everything stands in the state of a field; a sum is followed by what its additions rounded away. */
export const place = {
  absolute: 0, square: 2, signed: 4, exactAbsolute: 6, exactSquare: 8, largest: 10, exactLargest: 11, min: 12, max: 13,
  /** Row of the last block with the largest error so far, -1 where it was in an earlier one. */
  largestRow: 14,
  /** 1 where something was not finite, or so large that sums of its squares may not be. */
  isBad: 15,
} as const;
export const stateLength = 16;
/** A state of weights is one sum, and whether one was bad. */
export const weightPlace = { sum: 0, isBad: 2 } as const;
export const weightLength = 3;

// Sums run plainly over this many rows and are then compensated: as good as compensating every row, at a fraction of the time.
const run = 128;
/** Sums of this many squares must fit into a double: more rows than any file has. */
export const mostRows = 2 ** 40;

export function beginState(state: Float64Array): void {
  state.fill(0);
  state[place.largest] = -1;
  state[place.min] = Infinity;
  state[place.max] = -Infinity;
}

/**
 * Adds rows of one field to its state: with e = q − q_exact the sums of w|e|, we², we, w|q_exact| and wq_exact², and the
 * extremes. Even and odd rows of a run have sums of their own, put together at its end, as a processor adds pairs.
 */
export function addErrors(state: Float64Array, columns: ErrorColumns, rows: number): void {
  const { values, exact } = columns;
  const before = state[place.largest] as number;
  for (let from = 0; from < rows; from += run) addRun(state, columns, from, Math.min(from + run, rows));
  const largest = state[place.largest] as number;
  if (largest === before) return;
  let row = 0;
  while (Math.abs((values[row] as number) - (exact[row] as number)) !== largest) row += 1;
  state[place.largestRow] = row;
}

/** Adds weights to their state; one that is not above 0 or not finite marks it. */
export function addWeights(state: Float64Array, weights: Float64Array, rows: number): void {
  for (let from = 0; from < rows; from += run) {
    const to = Math.min(from + run, rows);
    let even = 0, odd = 0;
    for (let i = from; i < to; i += 1) {
      const weight = weights[i] as number;
      if ((i - from) % 2 === 0) even += weight;
      else odd += weight;
      if (!(weight > 0 && weight < Infinity)) state[weightPlace.isBad] = 1;
    }
    addTo(state, weightPlace.sum, even + odd);
  }
}

function addRun(state: Float64Array, { values, exact, weights }: ErrorColumns, from: number, to: number): void {
  const sums = [0, 0, 0, 0, 0];
  let largest = state[place.largest] as number, exactLargest = state[place.exactLargest] as number;
  let min = state[place.min] as number, max = state[place.max] as number;
  for (let lane = 0; lane < 2; lane += 1) {
    let absolute = 0, square = 0, signed = 0, exactAbsolute = 0, exactSquare = 0;
    for (let i = from + lane; i < to; i += 2) {
      const value = values[i] as number;
      const known = exact[i] as number;
      const weight = weights === null ? 1 : (weights[i] as number);
      const error = value - known;
      const size = Math.abs(error);
      const exactSize = Math.abs(known);
      absolute += weight * size;
      square += weight * error * error;
      signed += weight * error;
      exactAbsolute += weight * exactSize;
      exactSquare += weight * known * known;
      if (size > largest) largest = size;
      if (exactSize > exactLargest) exactLargest = exactSize;
      if (value < min) min = value;
      if (value > max) max = value;
    }
    for (const [at, part] of [absolute, square, signed, exactAbsolute, exactSquare].entries()) sums[at] = (sums[at] as number) + part;
  }
  for (const [at, sum] of sums.entries()) addTo(state, 2 * at, sum);
  state.set([largest, exactLargest, min, max], place.largest);
  if (!Number.isFinite((sums[1] as number) * mostRows) || !Number.isFinite((sums[4] as number) * mostRows)) state[place.isBad] = 1;
}

/** A. Neumaier, ZAMM 54 (1974) 39–51, method IV, as compensated-sum.ts. */
function addTo(state: Float64Array, at: number, value: number): void {
  const sum = state[at] as number;
  const next = sum + value;
  state[at + 1] = (state[at + 1] as number) + (Math.abs(sum) >= Math.abs(value) ? (sum - next) + value : (value - next) + sum);
  state[at] = next;
}
