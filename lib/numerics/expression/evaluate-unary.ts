import { functions } from './functions';
import type { UnaryOperation } from './node';

/**
 * Applies one operation row by row. A value that stands in several rows on end, as the coordinates of a structured grid do,
 * is computed once. The commonest functions have loops of their own, in which the engine keeps every value in a register.
 */
export function evaluateUnary(operation: UnaryOperation, from: Float64Array, into: Float64Array, rows: number): void {
  switch (operation) {
    case 'negate':
      for (let i = 0; i < rows; i += 1) into[i] = -(from[i] as number);
      return;
    case 'sin':
      evaluateSines(from, into, rows);
      return;
    case 'cos':
      evaluateCosines(from, into, rows);
      return;
    case 'exp':
      evaluateExponentials(from, into, rows);
      return;
    case 'sqrt':
      for (let i = 0; i < rows; i += 1) into[i] = Math.sqrt(from[i] as number);
      return;
    default:
      evaluateAny(functions[operation], from, into, rows);
  }
}

function evaluateSines(from: Float64Array, into: Float64Array, rows: number): void {
  let before = NaN;
  let result = NaN;
  for (let i = 0; i < rows; i += 1) {
    const value = from[i] as number;
    if (value !== before) {
      before = value;
      result = Math.sin(value);
    }
    into[i] = result;
  }
}

function evaluateCosines(from: Float64Array, into: Float64Array, rows: number): void {
  let before = NaN;
  let result = NaN;
  for (let i = 0; i < rows; i += 1) {
    const value = from[i] as number;
    if (value !== before) {
      before = value;
      result = Math.cos(value);
    }
    into[i] = result;
  }
}

function evaluateExponentials(from: Float64Array, into: Float64Array, rows: number): void {
  let before = NaN;
  let result = NaN;
  for (let i = 0; i < rows; i += 1) {
    const value = from[i] as number;
    if (value !== before) {
      before = value;
      result = Math.exp(value);
    }
    into[i] = result;
  }
}

function evaluateAny(apply: (value: number) => number, from: Float64Array, into: Float64Array, rows: number): void {
  let before = NaN;
  let result = NaN;
  for (let i = 0; i < rows; i += 1) {
    const value = from[i] as number;
    if (value !== before) {
      before = value;
      result = apply(value);
    }
    into[i] = result;
  }
}
