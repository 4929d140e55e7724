import type { Position } from '../assessment';
import type { ColumnEngine } from '../column-engine';
import type { FieldPart, NormPart, SumPart } from './norm-part';
import { addErrors, addWeights, beginState, mostRows, place, stateLength, weightLength, weightPlace } from './run-sums';

export interface NormBlock {
  rows: number;
  x: Float64Array;
  y: Float64Array | null;
  z: Float64Array | null;
  /** Null where every row weighs the same. */
  weights: Float64Array | null;
  /** Per field, in the order of the names: the values of the file and the exact ones. */
  fields: readonly { values: Float64Array; exact: Float64Array }[];
  /** Where the coordinates of each row stand, where weights and fields are copies of some of the rows. */
  places?: Int32Array;
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

/** Room for what gatherers add up, one of them at a time. */
export interface NormRooms {
  engine: ColumnEngine | null;
  weights: Float64Array;
  fields: readonly Float64Array[];
}

/** Makes room for the sums of so many fields, in the memory of an engine where one adds them up. */
export function createNormRooms(fieldCount: number, engine: ColumnEngine | null = null): NormRooms {
  const allocate = (length: number) => engine?.allocate(length) ?? new Float64Array(length);
  return { engine, weights: allocate(weightLength), fields: Array.from({ length: fieldCount }, () => allocate(stateLength)) };
}

/**
 * Gathers the norms of every field block by block, in one pass: with e = q − q_exact and weights w,
 * L1 = Σw|e|/Σw, L2 = √(Σwe²/Σw), L∞ = max|e| and where, the signed mean Σwe/Σw, and the norms of the exact field.
 * A weight that is not positive, or a value that is not finite, is a problem with its row, and there are no norms then. createNormTotal makes norms of parts.
 */
export function createNormGatherer(fields: readonly string[], rooms = createNormRooms(fields.length)): NormGatherer {
  const { engine, weights: weightState } = rooms;
  const positions: Position[] = fields.map(() => ({ x: NaN }));
  const problems = new Map<string, NormProblem>();
  let rows = 0;
  let equalWeights = true;
  weightState.fill(0);
  rooms.fields.forEach(beginState);

  const report = (code: NormProblem['code'], field: string | null, row: number, value: number) => {
    const known = problems.get(`${code} ${field}`);
    if (known) known.count += 1;
    else problems.set(`${code} ${field}`, { code, field, count: 1, row, value });
  };
  const gatherWeights = (weights: Float64Array, count: number) => {
    if (engine?.addWeights(weightState, weights, count) !== true) addWeights(weightState, weights, count);
    if (weightState[weightPlace.isBad] === 0) return;
    weightState[weightPlace.isBad] = 0;
    for (let i = 0; i < count; i += 1) if (!((weights[i] as number) > 0 && (weights[i] as number) < Infinity)) report('weight-not-positive', null, rows + i, weights[i] as number);
  };

  return {
    add(block) {
      const { weights } = block;
      equalWeights = weights === null;
      if (weights !== null) gatherWeights(weights, block.rows);
      let isBad = false;
      for (const [index, field] of fields.entries()) {
        const part = block.fields[index];
        const state = rooms.fields[index] as Float64Array;
        if (part === undefined) throw new TypeError(`createNormGatherer: the block has no values of ${field}`);
        const columns = { values: part.values, exact: part.exact, weights };
        state[place.largestRow] = -1;
        if (engine?.addErrors(state, columns, block.rows) !== true) addErrors(state, columns, block.rows);
        const largestRow = state[place.largestRow] as number;
        if (largestRow >= 0) positions[index] = positionAt(block, block.places?.[largestRow] ?? largestRow);
        if (state[place.isBad] === 0) continue;
        state[place.isBad] = 0;
        isBad = true;
        findBad(part, weights, block.rows, (code, i, value) => report(code, field, rows + i, value));
      }
      if (isBad && weights !== null) findTooHeavy(weights, block.rows, (i) => report('weight-not-positive', null, rows + i, weights[i] as number));
      rows += block.rows;
    },
    rows: () => rows,
    problems: () => [...problems.values()],
    part: () => ({ rows, equalWeights, weights: sumAt(weightState, weightPlace.sum), fields: rooms.fields.map((state, index) => partOf(state, positions[index] as Position)) }),
  };
}

/** A finite weight that leaves a double no room for the sums of what it weighs. */
function findTooHeavy(weights: Float64Array, rows: number, report: (i: number) => void): void {
  for (let i = 0; i < rows; i += 1) if ((weights[i] as number) < Infinity && !Number.isFinite(4 * mostRows * (weights[i] as number))) report(i);
}

function findBad(
  part: { values: Float64Array; exact: Float64Array }, weights: Float64Array | null, rows: number,
  report: (code: NormProblem['code'], i: number, value: number) => void,
): void {
  for (let i = 0; i < rows; i += 1) {
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

function sumAt(state: Float64Array, at: number): SumPart {
  return { sum: state[at] as number, lost: state[at + 1] as number };
}

function partOf(state: Float64Array, at: Position): FieldPart {
  return {
    absolute: sumAt(state, place.absolute), square: sumAt(state, place.square), signed: sumAt(state, place.signed),
    exactAbsolute: sumAt(state, place.exactAbsolute), exactSquare: sumAt(state, place.exactSquare), at,
    largest: state[place.largest] as number, exactLargest: state[place.exactLargest] as number,
    min: state[place.min] as number, max: state[place.max] as number,
  };
}
