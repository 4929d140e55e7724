import type { ColumnEngine } from '../../numerics/column-engine';
import type { UnaryOperation } from '../../numerics/expression/node';

type Step = (from: number, into: number, rows: number) => void;
type Pair = (a: number, b: number, into: number, rows: number) => void;

/** What table-rows/ exports for columns in memory. */
export interface StepExports {
  sines: Step;
  cosines: Step;
  exponentials: Step;
  roots: Step;
  negate: Step;
  add: Pair;
  subtract: Pair;
  multiply: Pair;
  divide: Pair;
  addNumber: Pair;
  multiplyByNumber: Pair;
  pick(from: number, places: number, into: number, rows: number): void;
  addErrors(state: number, values: number, exact: number, weights: number, rows: number): void;
  addWeights(state: number, weights: number, rows: number): void;
}

interface Memory {
  column: (length: number) => Float64Array;
  addressOf: (array: Float64Array | Int32Array) => number | null;
}

/** Works on columns of a memory by compiled code, two rows at a time. */
export function createEngine(code: StepExports, { column, addressOf }: Memory): ColumnEngine {
  const steps: Partial<Record<UnaryOperation, Step>> = {
    sin: code.sines, cos: code.cosines, exp: code.exponentials, sqrt: code.roots, negate: code.negate,
  };
  const pairs = { add: code.add, subtract: code.subtract, multiply: code.multiply, divide: code.divide };
  return {
    allocate: column,
    unary(operation, from, into, rows) {
      const step = steps[operation];
      const [a, to] = [addressOf(from), addressOf(into)];
      if (step === undefined || a === null || to === null) return false;
      step(a, to, rows);
      return true;
    },
    binary(operation, { a: left, b: right, aNumber, bNumber }, into, rows) {
      const [a, b, to] = [addressOf(left), addressOf(right), addressOf(into)];
      if (a === null || b === null || to === null) return false;
      if (operation === 'power') {
        // As evaluate-binary.ts: squares and cubes are products.
        if (bNumber !== 2 && bNumber !== 3) return false;
        code.multiply(a, a, to, rows);
        if (bNumber === 3) code.multiply(to, a, to, rows);
      } else if (aNumber !== null && operation === 'add') code.addNumber(aNumber, b, to, rows);
      else if (aNumber !== null && operation === 'multiply') code.multiplyByNumber(aNumber, b, to, rows);
      else pairs[operation](a, b, to, rows);
      return true;
    },
    pick(from, places, into, rows) {
      const [a, at, to] = [addressOf(from), addressOf(places), addressOf(into)];
      if (a === null || at === null || to === null) return false;
      code.pick(a, at, to, rows);
      return true;
    },
    addErrors(state, { values, exact, weights }, rows) {
      const [at, q, known] = [addressOf(state), addressOf(values), addressOf(exact)];
      const weight = weights === null ? 0 : addressOf(weights);
      if (at === null || q === null || known === null || weight === null) return false;
      code.addErrors(at, q, known, weight, rows);
      return true;
    },
    addWeights(state, weights, rows) {
      const [at, weight] = [addressOf(state), addressOf(weights)];
      if (at === null || weight === null) return false;
      code.addWeights(at, weight, rows);
      return true;
    },
  };
}
