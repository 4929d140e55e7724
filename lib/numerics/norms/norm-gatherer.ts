import type { Position } from '../assessment';
import { createCompensatedSum, type CompensatedSum } from './compensated-sum';
import type { FieldPart, NormPart } from './norm-part';

interface NormBlock {
  rows: number;
  x: Float64Array;
  y: Float64Array | null;
  z: Float64Array | null;
  /** Null where every row weighs the same. */
  weights: Float64Array | null;
  /** Per field, in the order of the names: the values of the file and the exact ones. */
  fields: readonly { values: Float64Array; exact: Float64Array }[];
}

/** A value that no norm can be made of: how often, and the first row, counted from 0. */
export interface NormProblem {
  code: 'weight-not-positive' | 'value-not-finite' | 'exact-not-finite';
  field: string | null;
  count: number;
  row: number;
  value: number;
}

export interface NormGatherer {
  add(block: NormBlock): void;
  rows(): number;
  problems(): readonly NormProblem[];
  /** What the rows so far come to. It means nothing where there were problems. */
  part(): NormPart;
}

interface FieldSums {
  field: string;
  absolute: CompensatedSum; square: CompensatedSum; signed: CompensatedSum;
  exactAbsolute: CompensatedSum; exactSquare: CompensatedSum;
  largest: number; at: Position; exactLargest: number; min: number; max: number;
}

// Sums run plainly over this many rows and are then compensated: as good as compensating every row, at a fraction of the time.
const run = 128;
/** Sums of this many squares must fit into a double: more rows than any file has. */
const mostRows = 2 ** 40;

/**
 * Gathers the norms of every field block by block, in one pass: with e = q − q_exact and weights w,
 * L1 = Σw|e|/Σw, L2 = √(Σwe²/Σw), L∞ = max|e| and where, the signed mean Σwe/Σw, and the norms of the exact field.
 * A weight that is not positive, or a value that is not finite, is a problem with its row, and there are no norms then. createNormTotal makes norms of parts.
 */
export function createNormGatherer(fields: readonly string[]): NormGatherer {
  const weightSum = createCompensatedSum();
  const sums = fields.map((field) => startSums(field));
  const problems = new Map<string, NormProblem>();
  let rows = 0;
  let equalWeights = true;

  const report = (code: NormProblem['code'], field: string | null, row: number, value: number) => {
    const known = problems.get(`${code} ${field}`);
    if (known) known.count += 1;
    else problems.set(`${code} ${field}`, { code, field, count: 1, row, value });
  };

  return {
    add(block) {
      const { weights } = block;
      equalWeights = weights === null;
      if (weights !== null) addWeights(weights, block.rows, weightSum, (i) => report('weight-not-positive', null, rows + i, weights[i] as number));
      for (const [index, sum] of sums.entries()) {
        const part = block.fields[index];
        if (part === undefined) throw new TypeError(`createNormGatherer: the block has no values of ${sum.field}`);
        for (let from = 0; from < block.rows; from += run) {
          const bad = addRun(sum, part.values, part.exact, block, from, Math.min(from + run, block.rows));
          if (bad) findBad(part, weights, from, Math.min(from + run, block.rows), (code, i, value) => report(code, sum.field, rows + i, value));
        }
      }
      rows += block.rows;
    },
    rows: () => rows,
    problems: () => [...problems.values()],
    part: () => ({ rows, equalWeights, weights: weightSum.part(), fields: sums.map(partOf) }),
  };
}

function startSums(field: string): FieldSums {
  return {
    field, absolute: createCompensatedSum(), square: createCompensatedSum(), signed: createCompensatedSum(),
    exactAbsolute: createCompensatedSum(), exactSquare: createCompensatedSum(),
    largest: -1, at: { x: NaN }, exactLargest: 0, min: Infinity, max: -Infinity,
  };
}

function addWeights(weights: Float64Array, rows: number, sum: CompensatedSum, onBad: (i: number) => void): void {
  for (let from = 0; from < rows; from += run) {
    const to = Math.min(from + run, rows);
    let part = 0;
    let isGood = true;
    for (let i = from; i < to; i += 1) {
      const weight = weights[i] as number;
      part += weight;
      isGood &&= weight > 0 && weight < Infinity;
    }
    sum.add(part);
    if (isGood) continue;
    for (let i = from; i < to; i += 1) if (!((weights[i] as number) > 0 && (weights[i] as number) < Infinity)) onBad(i);
  }
}

/** Whether something in the run is not finite, or so large that sums of its squares may not be. */
function addRun(sum: FieldSums, values: Float64Array, exact: Float64Array, block: NormBlock, from: number, to: number): boolean {
  const { weights } = block;
  let absolute = 0, square = 0, signed = 0, exactAbsolute = 0, exactSquare = 0;
  let largest = sum.largest, exactLargest = sum.exactLargest, min = sum.min, max = sum.max, largestRow = -1;
  for (let i = from; i < to; i += 1) {
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
    if (size > largest) {
      largest = size;
      largestRow = i;
    }
    if (exactSize > exactLargest) exactLargest = exactSize;
    if (value < min) min = value;
    if (value > max) max = value;
  }
  sum.absolute.add(absolute);
  sum.square.add(square);
  sum.signed.add(signed);
  sum.exactAbsolute.add(exactAbsolute);
  sum.exactSquare.add(exactSquare);
  sum.exactLargest = exactLargest;
  sum.min = min;
  sum.max = max;
  if (largestRow >= 0) {
    sum.largest = largest;
    sum.at = positionAt(block, largestRow);
  }
  return !Number.isFinite(square * mostRows) || !Number.isFinite(exactSquare * mostRows);
}

function findBad(
  part: { values: Float64Array; exact: Float64Array }, weights: Float64Array | null, from: number, to: number,
  report: (code: NormProblem['code'], i: number, value: number) => void,
): void {
  for (let i = from; i < to; i += 1) {
    const value = part.values[i] as number;
    const known = part.exact[i] as number;
    // A value whose weighted squared errors might add up beyond the largest double has no norm either.
    const room = 4 * mostRows * (weights === null ? 1 : (weights[i] as number));
    if (!Number.isFinite(room)) continue;
    if (!Number.isFinite(room * value * value)) report('value-not-finite', i, value);
    if (!Number.isFinite(room * known * known)) report('exact-not-finite', i, known);
  }
}

function positionAt(block: NormBlock, i: number): Position {
  const at: Position = { x: block.x[i] as number };
  if (block.y !== null) at.y = block.y[i];
  if (block.z !== null) at.z = block.z[i];
  return at;
}

function partOf(sum: FieldSums): FieldPart {
  const { largest, at, exactLargest, min, max } = sum;
  return {
    absolute: sum.absolute.part(), square: sum.square.part(), signed: sum.signed.part(),
    exactAbsolute: sum.exactAbsolute.part(), exactSquare: sum.exactSquare.part(), largest, at, exactLargest, min, max,
  };
}
